import { type Result, failure } from "../core/problem/result.ts";
import type { ExcelClient } from "./client.ts";
import { hasCode, isPassing, problemOf } from "./faults.ts";

/** The oldest requirement set that has everything used without asking; anything newer is asked for where it is used. */
export const floor = { set: "ExcelApi", version: "1.12" } as const;

/** Works with Excel; what Excel refuses becomes a problem, a fault of ours stays an exception. */
export async function inExcel<T>(
  client: ExcelClient,
  work: (context: Excel.RequestContext) => Promise<Result<T>>,
): Promise<Result<T>> {
  if (!client.isSetSupported(floor.set, floor.version)) {
    return failure({ code: "excel-too-old", missing: `${floor.set} ${floor.version}` });
  }
  try {
    // Where Excel can, it waits until the user has finished the cell being edited.
    return await client.run({ delayForCellEdit: true }, work);
  } catch (fault) {
    const problem = problemOf(fault);
    if (problem === null) throw fault;
    return failure(problem);
  }
}

/** Waits between attempts, in milliseconds: a busy service is left alone for longer each time. */
const waits = [150, 600, 2000];

/** Repeats a reading, which changes nothing, while Excel is busy. */
export async function persist<T>(read: () => Promise<T>): Promise<T> {
  for (const wait of waits) {
    try {
      return await read();
    } catch (fault) {
      if (!isPassing(fault)) throw fault;
      await new Promise((resolve) => setTimeout(resolve, wait));
    }
  }
  return read();
}

/** Adding or showing a sheet fails without a telling code while another workbook has the focus (Windows, Mac). */
export async function inFront<T>(show: () => Promise<T>): Promise<T> {
  try {
    return await show();
  } catch (fault) {
    if (!hasCode("GeneralException")(fault)) throw fault;
    throw Object.assign(new Error("The workbook is not in front."), { code: "InactiveWorkbook" });
  }
}
