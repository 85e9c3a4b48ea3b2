import type { BookData, SheetData } from "../../../src/desk/book/bookData.ts";
import { blankSheet } from "../../../src/desk/book/blankSheet.ts";
import { calledFor } from "../books.ts";
import { type DataSet, dataSets } from "../dataSets.ts";
import { type FormulaFault, type Said, rangeFaults, readingFaults, sheetFaults, soundSheets } from "./faults.ts";
import { type Form, type Reporting, forms, linestForms, reportRows } from "./forms.ts";
import { type Worksheet, toSheetData, worksheetOf } from "./worksheet.ts";

/** A workbook whose report is made by formulas, with one fault or none. */
export interface FormulaBook {
  readonly name: string;
  /** Null where it is sound. */
  readonly said: Said | null;
  /** The data, then the report; no two books have a sheet of the same name. */
  readonly sheets: readonly [SheetData, SheetData];
}

const faults: readonly FormulaFault[] = [...rangeFaults, ...readingFaults, ...sheetFaults];

/** Each fault in so many data sets, in forms that take turns. */
const setsEach = 3;

export function formulaFaults(): FormulaBook[] {
  return faults.flatMap((fault, index) => {
    const sets = dataSets.filter(
      ({ id, drivers }) =>
        (fault.only === undefined || fault.only.includes(id)) && (fault.severalDrivers !== true || drivers.length > 1),
    );
    const possible = fault.forms ?? forms;
    return Array.from({ length: setsEach }, (_, turn) =>
      made(`F${index * setsEach + turn + 1}`, {
        set: sets[(index + turn * 3) % sets.length]!,
        form: possible[(index + turn) % possible.length]!,
        fault,
      }),
    );
  });
}

/** Reports without fault: LINEST's standard errors where the data allow them, and figures that rest on none elsewhere. */
export function soundFormulas(): FormulaBook[] {
  return dataSets.flatMap((set, index) => {
    const allowed = calledFor(set).errors.kind === "classical";
    const possible: readonly Form[] = allowed ? linestForms : ["one driver", "trend"];
    return [0, 1].map((turn) => {
      const { name, sheet } = soundSheets[(index + turn) % soundSheets.length]!;
      const form = possible[(index + turn) % possible.length]!;
      const fault = { name, said: null, ...(sheet && { sheet, ranges: wholeOf(set) }) };
      return made(`S${index * 2 + turn + 1}`, { set, form, fault });
    });
  });
}

/** The rows of the data set, whatever was put below them. */
const wholeOf = ({ key }: DataSet): NonNullable<FormulaFault["ranges"]> => {
  const span = { from: 0, to: key.cells.length };
  return () => ({ outcome: span, drivers: span });
};

interface Planting {
  readonly set: DataSet;
  readonly form: Form;
  readonly fault: Omit<FormulaFault, "said"> & { readonly said: Said | null };
}

function made(id: string, { set, form, fault }: Planting): FormulaBook {
  const plain = worksheetOf(set);
  const sheet = fault.sheet?.(plain) ?? plain;
  const names = set.drivers.map(({ name }) => name);
  const data = `Data${id}`;
  const rows = reportRows[form]({ ...reportingOf(fault, sheet, names), name: data });
  const standing: Worksheet = fault.since?.(sheet) ?? sheet;
  return {
    name: `${id} ${set.id}: ${fault.name} (${form})`,
    said: fault.said,
    sheets: [toSheetData(data, standing), blankSheet(`Report${id}`, fault.report?.(rows, names) ?? rows)],
  };
}

function reportingOf(fault: Planting["fault"], sheet: Worksheet, names: readonly string[]): Omit<Reporting, "name"> {
  const { ranges, constant = true, slip = 0, labels } = fault;
  const span = { from: 0, to: sheet.rows.length };
  const whole = { outcome: span, drivers: span };
  return { sheet, ranges: ranges?.(whole, sheet) ?? whole, constant, slip, labels: labels?.(names) ?? names };
}

export const bookOf = ({ sheets }: FormulaBook): BookData => ({ sheets, names: [], active: 1 });
