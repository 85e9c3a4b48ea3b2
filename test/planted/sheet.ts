import type { Claim, ClaimedForm, ClaimedLine, ReportedNumber } from "../../src/core/review/claim.ts";
import type { Cell } from "../../src/core/table/cells.ts";
import type { BookCell, SheetData } from "../../src/desk/book/bookData.ts";
import { blankSheet } from "../../src/desk/book/blankSheet.ts";
import type { DataSet } from "./dataSets.ts";
import { toCellColumn } from "../support/cellColumns.ts";

/** A sheet of data as it stands in the faulty workbook: key, outcome, drivers, spare column; headings in its first row. */
export interface Sheet {
  readonly headings: readonly string[];
  /** Row by row, headings not included. */
  readonly rows: readonly (readonly Cell[])[];
  readonly hidden: readonly number[];
  /** The rows that the report says it used, the second end not included. */
  readonly claimed: { readonly from: number; readonly to: number };
  readonly driverCount: number;
}

export const sheetName = "Data";

export function sheetOf({ key, outcome, drivers, spare }: DataSet): Sheet {
  const columns = [outcome, ...drivers, spare];
  return {
    headings: [key.name, ...columns.map(({ name }) => name)],
    rows: key.cells.map((cell, row) => [cell, ...columns.map(({ values }) => values[row]!)]),
    hidden: [],
    claimed: { from: 0, to: key.cells.length },
    driverCount: drivers.length,
  };
}

/** What a report claims beside its numbers. */
export interface Claiming {
  readonly constant: boolean;
  /** By column of the sheet; columns that are not named stand as they are. */
  readonly forms: Readonly<Record<number, ClaimedForm>>;
}

export function claimOf(sheet: Sheet, { constant, forms }: Claiming, reported: readonly ReportedNumber[]): Claim {
  const line = (track: number): ClaimedLine => ({
    name: sheet.headings[track]!,
    sheet: sheetName,
    runs: "down",
    track,
    first: 0,
    cells: toCellColumn([sheet.headings[track]!, ...sheet.rows.map((row) => row[track] ?? null)]),
    from: sheet.claimed.from + 1,
    count: sheet.claimed.to - sheet.claimed.from,
    form: forms[track] ?? "as it is",
    hidden: sheet.hidden.map((row) => row + 1),
  });
  const drivers = Array.from({ length: sheet.driverCount }, (_, j) => line(j + 2));
  return {
    place: "Report!A1:D12",
    origin: { kind: "typed" },
    outcome: line(1),
    drivers,
    constant,
    reported,
    others: [line(0), line(sheet.driverCount + 2)],
  };
}

/** The sheet as a file holds it. */
export function dataSheet({ headings, rows, hidden }: Sheet): SheetData {
  const plain = (cell: Cell): BookCell =>
    cell !== null && typeof cell === "object" && "date" in cell
      ? { value: cell.date, style: { numberFormat: "yyyy-mm-dd" } }
      : cell;
  return {
    ...blankSheet(sheetName, [headings, ...rows.map((row) => row.map(plain))]),
    hiddenRows: hidden.map((row) => row + 1),
  };
}
