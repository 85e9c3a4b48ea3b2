import packageFile from "../../package.json" with { type: "json" };
import { inlineAnalyst } from "../worker/inlineAnalyst.ts";
import { excelHost } from "../office/excelHost.ts";
import { openDesk } from "../desk/client/openDesk.ts";
import { functionsMetadata } from "../functions/metadata.ts";
import { registerFunctions } from "../functions/register.ts";
import type { Surroundings } from "../terminal/answerCommand.ts";
import { diskFiles } from "../terminal/fileAccess.ts";
import { runTerminal } from "../terminal/runTerminal.ts";

/** The desk without a screen, with the add-in's functions in it, so that a live sheet has its values when it is saved. */
const openBook: Surroundings["openBook"] = async (book) => {
  const desk = await openDesk({ book, functions: functionsMetadata() });
  registerFunctions(desk.CustomFunctions, inlineAnalyst);
  return {
    host: excelHost({
      run: desk.Excel.run,
      isSetSupported: (set, version) => desk.Office.context.requirements.isSetSupported(set, version),
    }),
    snapshot: async () => {
      await desk.settle();
      return desk.snapshot();
    },
    close: desk.close,
  };
};

const today = (): string => new Intl.DateTimeFormat("en-GB", { dateStyle: "long" }).format(new Date());

const ran = await runTerminal(process.argv.slice(2), {
  files: diskFiles,
  openBook,
  analyst: inlineAnalyst,
  today,
  version: packageFile.version,
});
process.stdout.write(ran.out);
process.stderr.write(ran.err);
process.exitCode = ran.status;
