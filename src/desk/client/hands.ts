import { fault } from "../excel/fault.ts";
import { areaAt } from "../excel/addresses.ts";
import { ensureWritable } from "../excel/guards.ts";
import type { Host } from "../excel/host.ts";
import { blockOf } from "../excel/rangeValues.ts";
import type { Area } from "../workbook/areas.ts";
import { activeSheet } from "../workbook/book.ts";
import { cellAt, cellsOf, formulaAt, kindOf, valueOf, type CellValue } from "../workbook/cells.ts";
import { flushDrafts } from "../workbook/drafts.ts";
import { selectAreas } from "../workbook/selection.ts";
import { writeCells } from "../workbook/write.ts";

/** What a person does at the sheet, for tests and for the terminal. Addresses as in formulas, "Months!B2". */
export interface Hands {
  /** Types into a cell, or into every cell of a range. */
  readonly edit: (address: string, typed: string | number | boolean) => void;
  /** Selects one area, or several held together. */
  readonly select: (...addresses: readonly string[]) => void;
  /** What the first cell of the address holds; "" where it is blank. */
  readonly value: (address: string) => CellValue;
  readonly values: (address: string) => readonly (readonly CellValue[])[];
  readonly formula: (address: string) => string;
  /** "#N/A" and the like, or null where the cell holds no error. */
  readonly error: (address: string) => string | null;
  /** What is said beside an error of the add-in's functions; "" where nothing is. */
  readonly message: (address: string) => string;
  readonly startEditing: () => void;
  readonly finishEditing: () => void;
}

export function hands(host: Host, messages: ReadonlyMap<string, string>): Hands {
  const { book, switches } = host;
  const area = (address: string): Area => areaAt(host, address, activeSheet(book));
  const cell = (address: string) => {
    const { sheet, row, column } = area(address);
    return cellAt(cellsOf(book, sheet), row, column);
  };
  return {
    edit: (address, typed) => {
      ensureWritable(host, area(address).sheet);
      writeCells(book, area(address), () => typed);
      flushDrafts(book);
    },
    select: (...addresses) => selectAreas(book, addresses.map(area)),
    value: (address) => valueOf(cell(address)),
    values: (address) => blockOf(host, area(address), valueOf) ?? tooLarge(),
    formula: (address) => formulaAt(book, area(address).sheet, area(address)),
    error: (address) => (kindOf(cell(address)) === "Error" ? String(valueOf(cell(address))) : null),
    message: (address) => messages.get(`${area(address).sheet} ${area(address).row} ${area(address).column}`) ?? "",
    startEditing: () => {
      switches.editing = true;
    },
    finishEditing: () => {
      switches.editing = false;
    },
  };
}

function tooLarge(): never {
  throw fault("InvalidArgument");
}
