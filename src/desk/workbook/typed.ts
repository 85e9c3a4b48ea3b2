import { CellValueType, numfmt, type ICellData } from "@univerjs/core";
import { isErrorSign } from "./cells.ts";

/** What Excel makes of something written into a cell. */
export interface Typed {
  readonly cell: ICellData;
  /** The number format that the text brings along ("12%", "2024-01-02"), for a cell of format General. */
  readonly format: string | null;
}

/** What a cell held before goes with the new content: formula, share in a filled formula, rich text. */
const keep = ({ v = null, t = null, f = null }: ICellData, format: string | null = null): Typed => ({
  cell: { v, t, f, si: null, p: null },
  format,
});

const text = (value: string): Typed => keep({ v: value, t: CellValueType.FORCE_STRING });
const boolean = (value: boolean): Typed => keep({ v: value ? 1 : 0, t: CellValueType.BOOLEAN });

const shownAs = (value: string | number | boolean): string =>
  typeof value === "boolean" ? String(value).toUpperCase() : String(value);

/**
 * Excel reads strings written through its API as if they were typed: "005" is 5, "12%" is 0.12, "2024-01-02" a date.
 * @param format - the cell's number format: under "@" everything becomes text, formulas and numbers too.
 */
export function asTyped(value: string | number | boolean, format: string): Typed {
  if (value === "") return keep({});
  if (numfmt.isTextFormat(format)) return text(shownAs(value));
  if (typeof value === "number") return keep({ v: value, t: CellValueType.NUMBER });
  if (typeof value === "boolean") return boolean(value);
  if (value.startsWith("'")) return text(value.slice(1));
  if (value.startsWith("=") && value.length > 1) return keep({ f: value });
  if (isErrorSign(value.toUpperCase())) return keep({ v: value.toUpperCase(), t: CellValueType.STRING });
  const read = numfmt.parseValue(value);
  if (read === null) return keep({ v: value, t: CellValueType.STRING });
  if (typeof read.v === "boolean") return boolean(read.v);
  return keep({ v: read.v, t: CellValueType.NUMBER }, read.z ?? null);
}

const wordsAlone = /^\p{L}\P{Nd}*$/u;

/** Whether text would be text again if someone entered it: the cell line shows any other behind an apostrophe. */
export function staysText(value: string): boolean {
  if (wordsAlone.test(value)) return !["TRUE", "FALSE"].includes(value.toUpperCase());
  return asTyped(value, "General").cell.t === CellValueType.STRING && !isErrorSign(value.toUpperCase());
}
