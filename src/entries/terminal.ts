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
await written(process.stdout, ran.out);
await written(process.stderr, ran.err);
// What is said is said: calls that a book's own functions still wait for must not keep the command alive.
process.exit(ran.status);

/** Resolves when the stream has taken the text: an exit before would cut off what goes into a pipe. */
function written(stream: NodeJS.WriteStream, text: string): Promise<void> {
  return new Promise((resolve) => {
    stream.write(text, () => resolve());
  });
}
