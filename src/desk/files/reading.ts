/** What became of a file: what it held, or why it could not be read, as the end of the sentence "... cannot be read: ". */
export type Reading<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly because: string };

export const readable = <T>(value: T): Reading<T> => ({ ok: true, value });
export const unreadable = (because: string): { readonly ok: false; readonly because: string } => ({
  ok: false,
  because,
});

const startsWith = (bytes: Uint8Array, sign: readonly number[]): boolean =>
  sign.every((byte, index) => bytes[index] === byte);

const zipSign = [0x50, 0x4b];
/** The container of the old binary formats, and of encrypted workbooks. */
const compoundSign = [0xd0, 0xcf, 0x11, 0xe0];

/** Why these bytes cannot be an .xlsx file, told from how they begin; null where they may be one. */
export function whyNoXlsx(bytes: Uint8Array): string | null {
  if (bytes.length === 0) return "the file is empty";
  if (startsWith(bytes, zipSign)) return null;
  if (!startsWith(bytes, compoundSign)) return "it is no Excel workbook (.xlsx)";
  const encrypted = new TextDecoder("utf-16le").decode(bytes).includes("EncryptedPackage");
  return encrypted
    ? "it is protected with a password; save a copy without one"
    : "it is in the old .xls format; save it as .xlsx";
}
