import type { Analyst, Inquirer } from "../app/analyst.ts";
import type { Host } from "../app/host.ts";
import type { BookData } from "../desk/book/bookData.ts";
import { openDesk } from "../desk/client/openDesk.ts";
import { functionsMetadata } from "../functions/metadata.ts";
import { registerFunctions } from "../functions/register.ts";
import { excelHost } from "../office/excelHost.ts";

/** A workbook opened in the desk, for as long as a command needs it. */
export interface OpenBook {
  readonly host: Host;
  readonly snapshot: () => Promise<BookData>;
  readonly close: () => void;
}

/** Opens a workbook in the desk without a screen, the add-in's functions in it, so that a live sheet has values when saved. */
export const deskBook =
  (analyst: Analyst & Inquirer) =>
  async (book: BookData): Promise<OpenBook> => {
    const desk = await openDesk({ book, functions: functionsMetadata() });
    const { Excel: excel, Office: office, CustomFunctions: functions } = desk;
    await office.onReady();
    registerFunctions(functions, analyst);
    return {
      host: excelHost({
        run: excel.run,
        isSetSupported: (set, version) => office.context.requirements.isSetSupported(set, version),
      }),
      snapshot: async () => {
        await desk.settle();
        return desk.snapshot();
      },
      close: desk.close,
    };
  };
