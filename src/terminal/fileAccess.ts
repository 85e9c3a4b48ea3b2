import { readFile, writeFile } from "node:fs/promises";

export type FileResult<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly because: string };

/** Files as the terminal needs them; a file that cannot be had is an answer, not an exception. */
export interface FileAccess {
  readonly read: (file: string) => Promise<FileResult<Uint8Array>>;
  readonly write: (file: string, bytes: Uint8Array) => Promise<FileResult<null>>;
}

/** What the system says of a file, in words. */
const reasons: Readonly<Record<string, string>> = {
  ENOENT: "there is no such file or folder",
  EACCES: "you have no permission for it",
  EPERM: "you have no permission for it",
  EISDIR: "it is a folder",
  ENOSPC: "the disk is full",
  EBUSY: "another program holds it open",
};

async function attempt<T>(work: () => Promise<T>): Promise<FileResult<T>> {
  try {
    return { ok: true, value: await work() };
  } catch (error) {
    const code = error instanceof Error && "code" in error ? String(error.code) : "";
    const because = reasons[code];
    if (because === undefined) throw error;
    return { ok: false, because };
  }
}

export const diskFiles: FileAccess = {
  read: (file) => attempt(async () => new Uint8Array(await readFile(file))),
  write: (file, bytes) =>
    attempt(async () => {
      await writeFile(file, bytes);
      return null;
    }),
};
