import type { DriverAnswer } from "../core/answer/answer.ts";
import { confidenceInWords } from "../core/answer/wording.ts";
import type { SettingPair } from "../core/answer/settingsSaid.ts";
import { textHeight } from "./columns.ts";
import {
  type ComparedDriver,
  type ComparedModel,
  comparabilityOf,
  comparedDrivers,
  comparedLines,
} from "./comparison.ts";
import { figureFormat, formatFor, numberHeadingFormat, pValueFormat } from "./numberFormats.ts";
import type { PlanCell, PlanFormat, SheetPlan } from "./plan.ts";
import { cautionLine } from "./plainWordsSection.ts";
import { type Section, cellOf, number, rectangle, section, stack, text } from "./section.ts";

/** What the sheet must say of each model that the answers do not know. */
export interface ComparisonFacts {
  /** "1 December 2026" */
  readonly date: string;
  readonly version: string;
  /** One a model. */
  readonly models: readonly { readonly fingerprint: string; readonly settings: readonly SettingPair[] }[];
}

/** Two columns of labels, then one a model, in characters. */
const widths = { driver: 28, figure: 22, model: 26 } as const;
const labels = 2;

/** Models side by side: drivers in rows, models in columns. Values alone; each model's own sheet can be live. */
export function planComparison(models: readonly ComparedModel[], facts: ComparisonFacts): SheetPlan {
  const columns = labels + models.length;
  const parts = [
    headPart(models, facts),
    notesPart(models, columns),
    driversPart(models),
    linesPart(models),
    madePart(models, facts),
  ];
  const { rows, formats } = stack(parts);
  return {
    name: "Comparison",
    blocks: [{ row: 0, column: 0, cells: rectangle(rows, columns) }],
    formats,
    links: [],
    columnWidths: [widths.driver, widths.figure, ...models.map(() => widths.model)],
    frozenRows: 1,
    charts: [],
    printArea: { row: 0, column: 0, rows: rows.length, columns },
  };
}

function headPart(models: readonly ComparedModel[], { date, version }: ComparisonFacts): Section {
  const columns = labels + models.length;
  const across = (row: number, style: NonNullable<PlanFormat["style"]>): PlanFormat => ({
    area: { row, column: 0, rows: 1, columns },
    style,
    merge: true,
    wrap: true,
  });
  const caution = { ...across(2, "caution"), rowHeight: heightOver(cautionLine, columns) };
  return section(
    [
      [text(`${models.length} models side by side`)],
      [text(`${date}. Made with Footing ${version}. Values, as the cells were then.`)],
      [text(cautionLine)],
    ],
    [{ ...across(0, "title"), rowHeight: 28 }, across(1, "note"), caution],
  );
}

const heightOver = (words: string, columns: number): number =>
  textHeight(words, widths.driver + widths.figure + (columns - labels) * widths.model);

function notesPart(models: readonly ComparedModel[], columns: number): Section {
  const notes = comparabilityOf(models);
  return section(
    [[text("What can be compared")], ...notes.map((note) => [text(note)])],
    [
      { area: { row: 0, column: 0, rows: 1, columns }, style: "heading" },
      ...notes.map((note, index): PlanFormat => ({
        area: { row: index + 1, column: 0, rows: 1, columns },
        style: "sentence",
        merge: true,
        wrap: true,
        rowHeight: heightOver(note, columns),
      })),
    ],
  );
}

const modelHeadings = (models: readonly ComparedModel[]): PlanCell[] => models.map(({ name }) => text(name));

const headingsOf = ({ length }: readonly ComparedModel[]): PlanFormat => ({
  area: { row: 1, column: labels, rows: 1, columns: length },
  align: "right",
  numberFormat: numberHeadingFormat,
});

interface DriverLine {
  readonly label: string;
  readonly cell: (driver: DriverAnswer) => PlanCell;
  readonly format: (drivers: readonly DriverAnswer[]) => string;
}

const amounts = (drivers: readonly DriverAnswer[]): string => formatFor(drivers.map((driver) => driver.standardError));

const driverLines = (level: string): readonly DriverLine[] => [
  { label: "coefficient", cell: ({ coefficient }) => number(coefficient), format: amounts },
  { label: "standard error", cell: ({ standardError }) => number(standardError), format: amounts },
  { label: `${level} interval from`, cell: ({ low }) => number(low), format: amounts },
  { label: "to", cell: ({ high }) => number(high), format: amounts },
  { label: "p-value", cell: ({ pValue }) => number(pValue), format: () => pValueFormat },
  { label: "firm or leaning", cell: ({ firmness }) => text(firmness.kind), format: () => numberHeadingFormat },
];

function driversPart(models: readonly ComparedModel[]): Section {
  const levels = [...new Set(models.map(({ answer }) => confidenceInWords(answer.options.level)))];
  const lines = driverLines(levels.length === 1 ? (levels[0] ?? "") : "");
  const drivers = comparedDrivers(models);
  const rows = drivers.flatMap((driver) => driverRows(driver, lines));
  const columns = labels + models.length;
  const formats = drivers.flatMap((driver, index) => driverFormats(driver, { lines, row: 2 + index * lines.length }));
  return section(
    [[text("Drivers")], [text("Driver"), text("Figure"), ...modelHeadings(models)], ...rows],
    [
      { area: { row: 0, column: 0, rows: 1, columns }, style: "heading" },
      { area: { row: 1, column: 0, rows: 1, columns }, style: "table heading", wrap: true, heads: rows.length },
      headingsOf(models),
      { area: { row: 2, column: 0, rows: rows.length, columns: labels }, style: "label" },
      {
        area: { row: 2, column: labels, rows: rows.length, columns: models.length },
        style: "sentence",
        align: "right",
      },
      ...formats,
    ],
  );
}

/** A model without the driver says so once, in the row of the coefficient. */
function driverRows({ term, in: found }: ComparedDriver, lines: readonly DriverLine[]): PlanCell[][] {
  return lines.map(({ label, cell }, index) => [
    text(index === 0 ? term : ""),
    text(label),
    ...found.map((driver) => (driver === null ? text(index === 0 ? "not in it" : "") : cell(driver))),
  ]);
}

function driverFormats(
  { in: found }: ComparedDriver,
  { lines, row }: { readonly lines: readonly DriverLine[]; readonly row: number },
): PlanFormat[] {
  const columns = found.length;
  const drivers = found.filter((driver) => driver !== null);
  return [
    { area: { row, column: 0, rows: 1, columns: labels + columns }, style: "in force" },
    ...lines.map(({ format }, index): PlanFormat => ({
      area: { row: row + index, column: labels, rows: 1, columns },
      numberFormat: format(drivers),
    })),
  ];
}

function linesPart(models: readonly ComparedModel[]): Section {
  const lines = comparedLines(models);
  const columns = labels + models.length;
  const tallest = (values: readonly (string | number)[]): number =>
    Math.max(...values.map((value) => textHeight(typeof value === "number" ? "" : value, widths.model)));
  return section(
    [
      [text("Models")],
      [null, null, ...modelHeadings(models)],
      ...lines.map(({ label, values }) => [text(label), null, ...values.map(cellOf)]),
    ],
    [
      { area: { row: 0, column: 0, rows: 1, columns }, style: "heading" },
      { area: { row: 1, column: 0, rows: 1, columns }, style: "table heading", wrap: true, heads: lines.length },
      headingsOf(models),
      { area: { row: 2, column: 0, rows: lines.length, columns: labels }, style: "label" },
      {
        area: { row: 2, column: labels, rows: lines.length, columns: models.length },
        style: "sentence",
        align: "right",
        wrap: true,
      },
      ...lines.map(({ values }, index): PlanFormat => ({
        area: { row: 2 + index, column: labels, rows: 1, columns: models.length },
        numberFormat: figureFormat(values[0]),
        rowHeight: tallest(values),
      })),
    ],
  );
}

/** Enough of each model to make it again: its data, settings and fingerprint. */
function madePart(models: readonly ComparedModel[], { models: facts }: ComparisonFacts): Section {
  const rows = models.flatMap(({ name, address, answer }, index) => {
    const { settings = [], fingerprint = "" } = facts[index] ?? {};
    const lines: readonly (readonly [string, string])[] = [
      ["Data", address],
      ...settings,
      ...answer.notes.map((note) => ["Done to the data", note] as const),
      ["Fingerprint (SHA-256)", fingerprint],
    ];
    return lines.map(([label, value], line) => ({ name: line === 0 ? name : "", label, value }));
  });
  return section(
    [[text("How this was made")], ...rows.map(({ name, label, value }) => [text(name), text(label), text(value)])],
    [
      { area: { row: 0, column: 0, rows: 1, columns: labels + models.length }, style: "heading" },
      { area: { row: 1, column: 0, rows: rows.length, columns: labels }, style: "label" },
      ...rows.map(({ value }, index): PlanFormat => ({
        area: { row: index + 1, column: labels, rows: 1, columns: models.length },
        style: "sentence",
        align: "left",
        merge: true,
        wrap: true,
        rowHeight: textHeight(value, models.length * widths.model),
      })),
    ],
  );
}
