import type { FunctionsRuntime } from "../../src/functions/cellErrors.ts";

/** The signs of Excel's errors by the runtime's names. */
export const ErrorCode = {
  invalidValue: "#VALUE!",
  notAvailable: "#N/A",
  divisionByZero: "#DIV/0!",
  invalidNumber: "#NUM!",
  nullReference: "#NULL!",
  invalidName: "#NAME?",
  invalidReference: "#REF!",
} as unknown as typeof CustomFunctions.ErrorCode;

/** As the vendor's runtime has it: an Error that JSON writes out with its code and message. */
class CellError extends Error {
  readonly type = "CustomFunctionError";
  constructor(
    readonly code: CustomFunctions.ErrorCode,
    message?: string,
  ) {
    super(message ?? "");
  }
  toJSON(): object {
    return { valueType: this.type, type: this.type, code: this.code, basicValue: this.code, message: this.message };
  }
}

export type Implementation = (...handed: unknown[]) => Promise<unknown[][]>;

export interface Runtime {
  readonly runtime: FunctionsRuntime;
  readonly functions: Map<string, Implementation>;
}

export function functionsRuntime(): Runtime {
  const functions = new Map<string, Implementation>();
  const associate = ((id: string, implementation: Implementation) =>
    void functions.set(id, implementation)) as typeof CustomFunctions.associate;
  return { functions, runtime: { associate, Error: CellError, ErrorCode } };
}

/** What stands in a cell after a result went through JSON, as Excel shows it: a null within a result becomes 0. */
export type Shown = number | string | boolean | { readonly error: string; readonly message: string };

export const throughExcel = (result: unknown[][]): Shown[][] =>
  (JSON.parse(JSON.stringify(result)) as unknown[][]).map((row) => row.map(shown));

function shown(cell: unknown): Shown {
  if (cell === null) return 0;
  if (typeof cell === "object") {
    const { code, message } = cell as { code: string; message: string };
    return { error: code, message };
  }
  return cell as Shown;
}

/** Calls as Excel does: one value a parameter, blanks as the host has them, the invocation last. */
export async function call(
  { functions }: Runtime,
  id: string,
  ...values: unknown[]
): Promise<Shown[][] | Extract<Shown, object>> {
  const implementation = functions.get(id);
  if (implementation === undefined) throw new Error(`no function ${id}`);
  try {
    return throughExcel(await implementation(...values, {}));
  } catch (fault) {
    if (!(fault instanceof CellError)) throw fault;
    return { error: fault.code, message: fault.message };
  }
}
