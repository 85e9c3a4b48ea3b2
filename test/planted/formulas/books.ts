import type { BookData, SheetData } from "../../../src/desk/book/bookData.ts";
import { blankSheet } from "../../../src/desk/book/blankSheet.ts";
import { calledFor } from "../books.ts";
import { type DataSet, dataSets } from "../dataSets.ts";
import { type Calculated, calculated } from "./calculated.ts";
import { type FormulaFault, type Said, rangeFaults, readingFaults, sheetFaults, soundSheets } from "./faults.ts";
import { type Form, type Reporting, forms, linestForms, readerForms, reportRows } from "./forms.ts";
import { type Worksheet, changed, numberIn, toSheetData, worksheetOf } from "./worksheet.ts";

/** A workbook whose report is made by formulas, with one fault or none. */
export interface FormulaBook {
  readonly name: string;
  readonly kind: "single" | "pair" | "sound";
  readonly said: readonly Said[];
  /** The data, then the report; no two books have a sheet of the same name. */
  readonly sheets: readonly [SheetData, SheetData];
}

const faults: readonly FormulaFault[] = [...rangeFaults, ...readingFaults, ...sheetFaults];

/** Each fault in so many data sets, in forms that take turns. */
const setsEach = 3;

export function formulaFaults(): FormulaBook[] {
  return faults.flatMap((fault, index) => {
    const [sets, possible] = [setsFor([fault]), formsFor([fault])];
    return Array.from({ length: setsEach }, (_, turn) =>
      made(`F${index * setsEach + turn + 1}`, {
        set: sets[(index + turn * 3) % sets.length]!,
        form: possible[(index + turn) % possible.length]!,
        together: [fault],
      }),
    );
  });
}

/** Each fault in every form and data set that it can be planted in. */
export function everyFormulaFault(): FormulaBook[] {
  return faults.flatMap((fault, index) =>
    setsFor([fault]).flatMap((set) =>
      formsFor([fault]).map((form) =>
        made(`E${index + 1}_${set.id.replaceAll("-", "")}_${form.replace(" ", "")}`, { set, form, together: [fault] }),
      ),
    ),
  );
}

/** What can go wrong where formulas name no drivers, each in every form and data set. */
export function positionFaults(): FormulaBook[] {
  return faults.flatMap(({ ofPositions = [], ...fault }, index) =>
    dataSets.flatMap((set) =>
      ofPositions.map((form, turn) =>
        made(`T${index + 1}_${set.id.replaceAll("-", "")}_${turn}`, { set, form, together: [fault] }),
      ),
    ),
  );
}

/** What can go wrong where a table reads LINEST's cells, each in every form and data set. */
export function readerFaults(): FormulaBook[] {
  return faults.flatMap((fault, index) =>
    readerForms
      .filter((form) => isReadable(fault, form))
      .flatMap((form, turn) =>
        setsFor([fault]).map((set) =>
          made(`Q${index + 1}_${set.id.replaceAll("-", "")}_${turn}`, { set, form, together: [fault] }),
        ),
      ),
  );
}

/** A name that is looked up is never that of another. */
const isReadable = ({ forms: only, labels }: FormulaFault, form: Form): boolean =>
  (only === undefined || only.includes("index")) && !(labels !== undefined && form === "read by MATCH");

/** Tables that read LINEST's cells, without fault, where the data allow its standard errors. */
export const soundReaders = (): FormulaBook[] =>
  dataSets
    .filter((set) => calledFor(set).errors.kind === "classical")
    .flatMap((set, index) =>
      readerForms.map((form, turn) => made(`V${index + 1}_${turn}`, { set, form, together: [{ name: "no fault" }] })),
    );

/** The outcome without its constant: a line through zero is right then. */
const throughZero: NonNullable<FormulaFault["sheet"]> = (sheet) => {
  const constant = wholly(sheet, true)?.fit.coefficients[0] ?? 0;
  return changed(sheet, 1, [sheet.rows.map((_, row) => row), (cell) => (numberIn(cell) ?? 0) - constant]);
};

/** What a spreadsheet makes of all rows and drivers. */
function wholly(sheet: Worksheet, constant: boolean): Calculated | null {
  const span = { from: 0, to: sheet.rows.length };
  const drivers = Array.from({ length: sheet.driverCount }, (_, j) => j + 2);
  return calculated(sheet, { ranges: { outcome: span, drivers: span }, drivers, constant, otherCells: "error" });
}

/** Whether every driver is shown at 5 % with a constant if it is without one, and the other way round. */
function survivesConstant(set: DataSet): boolean {
  const sheet = throughZero(worksheetOf(set));
  const [without, withIt] = [wholly(sheet, false), wholly(sheet, true)];
  const isShown = (pValue: number): boolean => pValue < 0.05;
  return without!.pValues.every((one, j) => isShown(one) === isShown(withIt!.pValues[j + 1]!));
}

/** LINEST without a constant where none is missed. */
export const soundThroughZero = (): FormulaBook[] =>
  dataSets
    .filter((set) => calledFor(set).errors.kind === "classical" && survivesConstant(set))
    .map((set, index) => {
      const unusual = { name: "a line through zero", sheet: throughZero, constant: false } as const;
      return made(`W${index + 1}`, { set, form: linestForms[index % linestForms.length]!, together: [unusual] });
    });

/** Formulas that name no drivers, without fault: figures that rest on no standard errors. */
export const soundPositions = (): FormulaBook[] =>
  dataSets.map((set, index) =>
    made(`U${index + 1}`, { set, form: "trend of positions", together: [{ name: "no fault" }] }),
  );

/** Faults of different sorts that happen together, in one form and data set each. */
export function formulaPairs(): FormulaBook[] {
  const sorts = [rangeFaults, readingFaults, sheetFaults];
  const couples = sorts.flatMap((first, i) =>
    sorts.slice(i + 1).flatMap((second) => first.flatMap((one) => second.map((other) => [one, other] as const))),
  );
  return couples.flatMap((pair, index) => {
    const [sets, possible] = [setsFor(pair), formsFor(pair)];
    if (pair.some(({ alone }) => alone === true) || sets.length * possible.length === 0) return [];
    const set = sets[index % sets.length]!;
    return [made(`P${index + 1}`, { set, form: possible[index % possible.length]!, together: pair })];
  });
}

const setsFor = (together: readonly FormulaFault[]): DataSet[] =>
  dataSets.filter(({ id, drivers }) =>
    together.every(
      ({ only, severalDrivers }) =>
        (only === undefined || only.includes(id)) && (severalDrivers !== true || drivers.length > 1),
    ),
  );

const formsFor = (together: readonly FormulaFault[]): Form[] =>
  forms.filter((form) => together.every((fault) => fault.forms === undefined || fault.forms.includes(form)));

/** Reports without fault: LINEST's standard errors where the data allow them, and figures that rest on none elsewhere. */
export function soundFormulas(): FormulaBook[] {
  return dataSets.flatMap((set, index) => {
    const allowed = calledFor(set).errors.kind === "classical";
    const possible: readonly Form[] = allowed ? linestForms : ["one driver", "trend"];
    return [0, 1].map((turn) => {
      const { name, sheet } = soundSheets[(index + turn) % soundSheets.length]!;
      const form = possible[(index + turn) % possible.length]!;
      const unusual = { name, ...(sheet && { sheet, ranges: wholeOf(set) }) };
      return made(`S${index * 2 + turn + 1}`, { set, form, together: [unusual] });
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
  readonly together: readonly (Omit<FormulaFault, "said"> & { readonly said?: Said })[];
}

function made(id: string, { set, form, together }: Planting): FormulaBook {
  const sheet = together.reduce((one, fault) => fault.sheet?.(one) ?? one, worksheetOf(set));
  const names = set.drivers.map(({ name }) => name);
  const data = `Data${id}`;
  const calculated = reportRows[form]({ ...reportingOf(together, sheet, names), name: data });
  const standing = together.reduce((one, fault) => fault.since?.(one) ?? one, sheet);
  const rows = together.reduce((one, fault) => fault.report?.(one, names) ?? one, calculated);
  const said = together.flatMap((fault) => fault.said ?? []);
  return {
    name: `${id} ${set.id}: ${together.map(({ name }) => name).join(", and ")} (${form})`,
    kind: (["sound", "single", "pair"] as const)[said.length] ?? "pair",
    said,
    sheets: [toSheetData(data, standing), blankSheet(`Report${id}`, rows)],
  };
}

function reportingOf(
  together: Planting["together"],
  sheet: Worksheet,
  names: readonly string[],
): Omit<Reporting, "name"> {
  const span = { from: 0, to: sheet.rows.length };
  return {
    sheet,
    ranges: together.reduce((ranges, fault) => fault.ranges?.(ranges, sheet) ?? ranges, {
      outcome: span,
      drivers: span,
    }),
    constant: together.every(({ constant }) => constant !== false),
    slip: Math.max(...together.map(({ slip = 0 }) => slip)),
    labels: together.reduce((labels, fault) => fault.labels?.(labels) ?? labels, names),
  };
}

export const bookOf = ({ sheets }: FormulaBook): BookData => ({ sheets, names: [], active: 1 });
