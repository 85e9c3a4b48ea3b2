import packageFile from "../../package.json" with { type: "json" };
import { deskBook } from "../terminal/deskBook.ts";
import { diskFiles } from "../terminal/fileAccess.ts";
import { runTerminal } from "../terminal/runTerminal.ts";
import { inlineAnalyst } from "../worker/inlineAnalyst.ts";
import { inlineReviewer } from "../worker/inlineReviewer.ts";

const today = (): string => new Intl.DateTimeFormat("en-GB", { dateStyle: "long" }).format(new Date());

const ran = await runTerminal(process.argv.slice(2), {
  files: diskFiles,
  openBook: deskBook(inlineAnalyst),
  analyst: { ...inlineAnalyst, ...inlineReviewer },
  today,
  version: packageFile.version,
});
process.stdout.write(ran.out);
process.stderr.write(ran.err);
process.exitCode = ran.status;
