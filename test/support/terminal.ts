import type { Surroundings } from "../../src/terminal/answerCommand.ts";
import type { FileAccess } from "../../src/terminal/fileAccess.ts";
import { deskBook } from "../../src/terminal/deskBook.ts";
import { type Ran, runTerminal } from "../../src/terminal/runTerminal.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import { inlineReviewer } from "../../src/worker/inlineReviewer.ts";

export interface Shelf extends FileAccess {
  readonly files: Map<string, Uint8Array>;
}

/** Files in memory. */
export function shelf(contents: Readonly<Record<string, string | Uint8Array>>): Shelf {
  const bytes = (content: string | Uint8Array): Uint8Array =>
    typeof content === "string" ? new TextEncoder().encode(content) : content;
  const files = new Map(Object.entries(contents).map(([name, content]) => [name, bytes(content)]));
  return {
    files,
    read: (file) => {
      const found = files.get(file);
      const because = "there is no such file or folder";
      return Promise.resolve(found === undefined ? { ok: false, because } : { ok: true, value: found });
    },
    write: (file, content) => {
      files.set(file, content);
      return Promise.resolve({ ok: true, value: null });
    },
  };
}

/** Everything that the terminal computes with. */
export const wholeAnalyst = { ...inlineAnalyst, ...inlineReviewer };

/** Runs a command line over files in memory, with the real desk and the analysis given. */
export const terminalWith = (
  words: readonly string[],
  files: FileAccess,
  analyst: Surroundings["analyst"],
): Promise<Ran> =>
  runTerminal(words, {
    files,
    openBook: deskBook(inlineAnalyst),
    analyst,
    today: () => "1 December 2026",
    version: "0.0.0",
  });

/** The same with the real analysis. */
export const terminal = (words: readonly string[], files: FileAccess): Promise<Ran> =>
  terminalWith(words, files, wholeAnalyst);
