import type { Answer } from "../core/answer/answer.ts";
import { page, wrappedHeight } from "./columns.ts";
import { formatFor, numberHeadingFormat } from "./numberFormats.ts";
import { headingFormat } from "./pageFormats.ts";
import type { PlanCell, PlanFormat, PlanLink } from "./plan.ts";
import { type Section, number, section, text } from "./section.ts";

/** What each guard watches, for the first column. */
const titles: Readonly<Record<Answer["guards"]["found"][number]["guard"], string>> = {
  collinearity: "Drivers alike",
  influence: "Single rows",
  trending: "Wandering series",
  breaks: "Change over time",
  time: "Periods",
  groups: "Groups",
};

const mostRows = 5;

/** What to know beside the tests, then the rows that matter most with links to their cells. */
export function guardsSection(answer: Answer): Section {
  const words = sentenceRows(answer);
  const rows = answer.guards.rows.slice(0, mostRows);
  const table = rows.length === 0 ? [] : [rowHeadings.map(text), ...rows.map(rowCells)];
  const first = words.rows.length + 1;
  return section(
    [[text("Guards, when this sheet was made")], ...words.rows, ...table],
    [headingFormat(0), ...words.formats, ...(rows.length === 0 ? [] : tableFormats(first, rows.length))],
    rows
      .map(({ cell }, index): PlanLink => ({ row: first + 1 + index, column: 0, text: cell, target: cell }))
      .filter(isInSheet),
  );
}

/** Rows of a function's argument have no address to jump to. */
const isInSheet = ({ target }: PlanLink): boolean => target.includes("!");

function sentenceRows({ guards }: Answer): { rows: PlanCell[][]; formats: PlanFormat[] } {
  const lines = guards.found.flatMap(({ guard, sentences }) =>
    sentences.map((sentence, index) => ({ title: index === 0 ? titles[guard] : "", sentence })),
  );
  return {
    rows: lines.map(({ title, sentence }) => [text(title), text(sentence)]),
    formats: lines.flatMap(({ sentence }, index): PlanFormat[] => [
      { area: { row: index + 1, column: 0, rows: 1, columns: 1 }, style: "label" },
      {
        area: { row: index + 1, column: 1, rows: 1, columns: page.columns - 1 },
        style: "sentence",
        merge: true,
        wrap: true,
        rowHeight: wrappedHeight(sentence, 1),
      },
    ]),
  };
}

const rowHeadings = ["Most influential rows", "leverage", "Cook's distance", "DFFITS", "outside residual"] as const;

const rowCells = ({ cell, leverage, cook, dffits, outside }: Answer["guards"]["rows"][number]): PlanCell[] => [
  text(cell),
  number(leverage),
  number(cook),
  number(dffits),
  number(outside),
];

function tableFormats(row: number, count: number): PlanFormat[] {
  const figures = { column: 1, columns: rowHeadings.length - 1 };
  return [
    { area: { row, column: 0, rows: 1, columns: rowHeadings.length }, style: "table heading", heads: count },
    {
      area: { row, rows: 1, ...figures },
      align: "right",
      numberFormat: numberHeadingFormat,
      wrap: true,
      rowHeight: 30,
    },
    { area: { row: row + 1, rows: count, ...figures }, align: "right", numberFormat: formatFor([1]) },
  ];
}
