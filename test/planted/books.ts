import { analyse } from "../../src/core/answer/analyse.ts";
import { defaultOptions } from "../../src/core/answer/options.ts";
import type { ErrorsChoice } from "../../src/core/covariance/choice.ts";
import type { Fit } from "../../src/core/fit/fit.ts";
import type { Reference } from "../../src/core/inference/reference.ts";
import { type Random, randomFrom } from "../support/random.ts";
import type { Claim, ReportedNumber } from "../../src/core/review/claim.ts";
import type { Cell } from "../../src/core/table/cells.ts";
import type { BookData } from "../../src/desk/book/bookData.ts";
import { designOf, fitOf } from "../support/referenceFit.ts";
import { type DataSet, dataSets } from "./dataSets.ts";
import type { Expected, Fault, Made } from "./fault.ts";
import { cellFaults, columnFaults, errorFaults, modelFaults, reportFaults, rowFaults } from "./faults.ts";
import { type Style, reportOf, reportSheet } from "./report.ts";
import { type Sheet, claimOf, dataSheet, sheetOf } from "./sheet.ts";
import { toCellColumn } from "../support/cellColumns.ts";

/** A workbook with a report that has one fault, two, or none. */
export interface PlantedBook {
  readonly name: string;
  readonly kind: "single" | "pair" | "sound";
  readonly expected: readonly Expected[];
  /** What must be said of the report as it is read from the workbook; null where it cannot show the faults. */
  readonly expectedInBook: readonly Expected[] | null;
  readonly claim: Claim;
  readonly book: BookData;
}

const seed = 20260917;
const styles: readonly Style[] = ["errors", "p-values", "all", "bounds"];
const all: readonly Fault[] = [
  ...rowFaults,
  ...cellFaults,
  ...columnFaults,
  ...modelFaults,
  ...errorFaults,
  ...reportFaults,
];

/** Each fault in so many data sets. */
const setsEach = 2;

export function singles(): PlantedBook[] {
  const random = randomFrom(seed);
  return all.flatMap((fault, index) => {
    const sets = setsFor([fault]);
    return Array.from({ length: Math.min(setsEach, sets.length) }, (_, turn) => {
      const set = sets[(index + turn * 3) % sets.length]!;
      return planted(set, [fault], { random, style: styleFor([fault], index + turn), kind: "single" });
    });
  });
}

/** Faults of different sorts that happen together, the standard errors among them. */
export function pairs(): PlantedBook[] {
  const random = randomFrom(seed + 1);
  const sorts = [
    rowFaults,
    cellFaults,
    columnFaults.filter(({ name }) => !name.startsWith("logarithm claimed")),
    modelFaults,
    errorFaults,
  ];
  const together = sorts.flatMap((first, i) =>
    sorts.slice(i + 1).flatMap((second, j) =>
      Array.from({ length: 5 }, (_, turn) => {
        const pair = [
          first[(turn * 3 + i + j) % first.length]!,
          second[(turn * 5 + 2 * i + j) % second.length]!,
        ] as const;
        return pair;
      }),
    ),
  );
  return together.flatMap((pair, index) => {
    const sets = setsFor(pair);
    if (sets.length === 0) return [];
    const style = styleFor(pair, index);
    return [planted(sets[index % sets.length]!, pair, { random, style, kind: "pair" })];
  });
}

/** Reports without fault: the standard errors, and the law, that the evidence calls for. */
export function soundBooks(): PlantedBook[] {
  const random = randomFrom(seed + 2);
  return dataSets.flatMap((set, index) =>
    [0, 1].map((turn) =>
      planted(set, [], { random, style: styles[(index + 2 * turn + 1) % styles.length]!, kind: "sound" }),
    ),
  );
}

function setsFor(faults: readonly Fault[]): DataSet[] {
  return dataSets.filter(({ id }) => faults.every(({ only }) => only === undefined || only.includes(id)));
}

interface Planting {
  readonly random: Random;
  readonly style: Style;
  readonly kind: PlantedBook["kind"];
}

function planted(set: DataSet, faults: readonly Fault[], { random, style, kind }: Planting): PlantedBook {
  const sheet = faults.reduce((one, fault) => fault.sheet?.(one, random) ?? one, sheetOf(set));
  const made = faults.reduce((one, fault) => fault.made?.(one, { sheet, random }) ?? one, madeOf(sheet, faults));
  const fit = fitFrom(made);
  const { errors, law } = errorsFor(set, fit, { faults, kind });
  const level = faults.find((fault) => fault.level !== undefined)?.level ?? 0.05;
  const printed = reportOf(fit, { style, errors, law, level, order: made.order });
  const reported = faults.reduce<readonly ReportedNumber[]>(
    (numbers, fault) => fault.typed?.(numbers) ?? numbers,
    printed,
  );
  const constant = faults.every(({ claimsConstant }) => claimsConstant !== false);
  const forms = Object.assign({}, ...faults.map(({ claimedForms }) => claimedForms ?? {})) as NonNullable<
    Fault["claimedForms"]
  >;
  const claim = claimOf(sheet, { constant, forms }, reported);
  const names = claim.drivers.map(({ name }) => name);
  return {
    name: `${set.id}: ${faults.map(({ name }) => name).join(", and ") || "no fault"} (${style})`,
    kind,
    expected: faults.map(({ expected }) => expected),
    expectedInBook: inBook(faults),
    claim,
    book: { sheets: [dataSheet(sheet), reportSheet(reported, claim.outcome.name, names)], names: [], active: 1 },
  };
}

function inBook(faults: readonly Fault[]): readonly Expected[] | null {
  const said = faults.map((fault) => (fault.inBook === undefined ? fault.expected : fault.inBook));
  return said.every((one): one is Expected => one !== null) ? said : null;
}

/** The style whose turn it is, or the next that can show the faults. */
const styleFor = (faults: readonly Fault[], turn: number): Style =>
  styles
    .map((_, i) => styles[(turn + i) % styles.length]!)
    .find((style) => faults.every((fault) => fault.styles === undefined || fault.styles.includes(style)))!;

/** The rows as they were read: a row lacking anything is left out. */
function madeOf(sheet: Sheet, faults: readonly Fault[]): Made {
  const { from, to } = faults.reduce((span, fault) => fault.rows?.(sheet) ?? span, sheet.claimed);
  const read = faults.reduce(
    (reading, fault) => fault.read ?? reading,
    (cell: Cell): number | null => (typeof cell === "number" ? cell : null),
  );
  const drivers = Array.from({ length: sheet.driverCount }, (_, j) => j);
  const rows = sheet.rows.slice(from, to).flatMap((row, index) => {
    const [y, ...x] = [1, ...drivers.map((j) => j + 2)].map((track) => read(row[track] ?? null));
    return y === null || y === undefined || !x.every((one): one is number => one !== null)
      ? []
      : [{ at: from + index, y, x }];
  });
  return { rows, constant: true, order: drivers };
}

const fitFrom = ({ rows, constant }: Made): Fit =>
  fitOf(
    designOf(
      rows.map(({ y }) => y),
      rows[0]!.x.map((_, j) => rows.map(({ x }) => x[j]!)),
      { constant },
    ),
  );

/** Classical ones with faults of other sorts; without fault those that the evidence calls for. */
function errorsFor(
  set: DataSet,
  fit: Fit,
  { faults, kind }: { readonly faults: readonly Fault[]; readonly kind: PlantedBook["kind"] },
): { readonly errors: ErrorsChoice; readonly law: Reference } {
  const law: Reference = { law: "t", degreesOfFreedom: fit.degreesOfFreedom };
  const given = faults.find(({ errors }) => errors !== undefined)?.errors;
  if (given !== undefined || kind !== "sound") return { errors: given ?? { kind: "classical" }, law };
  const called = calledFor(set);
  return { errors: called.errors, law: called.reference };
}

/** What the evidence calls for on the whole data, rows through time where the first column says so. */
export function calledFor(set: DataSet) {
  const isTime = set.key.cells.every((cell) => typeof cell !== "string");
  const numbers = [set.outcome, ...set.drivers];
  const column = (name: string, cells: readonly Cell[], index: number) => ({
    name,
    place: { kind: "sheet", sheet: "Data", column: index, firstRow: 1 } as const,
    cells: toCellColumn(cells),
  });
  const answer = analyse(
    {
      source: {
        columns: [
          column(set.key.name, set.key.cells, 0),
          ...numbers.map(({ name, values }, j) => column(name, values, j + 1)),
        ],
        rowCount: set.key.cells.length,
      },
      model: {
        outcome: { column: set.outcome.name, transform: { kind: "none" } },
        drivers: set.drivers.map(({ name }) => ({
          column: name,
          as: "number",
          base: null,
          transform: { kind: "none" },
        })),
        calendar: [],
        rows: isTime ? { kind: "time", order: set.key.name } : { kind: "cases" },
        constant: true,
        textNumbers: [],
      },
      options: defaultOptions,
    },
    () => undefined,
  );
  if (!answer.ok) throw new Error(answer.problem.code);
  return answer.value.decision.called;
}
