import type { ClaimReview, Comparison } from "../../core/review/claimReview.ts";
import { namesOfDrivers } from "../../core/review/reviewTables.ts";
import { quantityInWords } from "../../core/review/quantityWords.ts";
import { type ShownDigits, digitsFor, digitsShown, showWith } from "../../core/review/shownDigits.ts";
import { numberHeadingFormat } from "../numberFormats.ts";
import type { PlanCell, PlanFormat } from "../plan.ts";
import { type Section, number, section, text } from "../section.ts";
import { acrossReview, linkTo, reviewColumns } from "./reviewPage.ts";

const figureColumns = { first: 2, count: 3 } as const;

/** Every reported number beside the same number recomputed, in the digits of the report. */
export function comparedSection(review: ClaimReview): Section {
  const { compared, explanation } = review;
  const lines = compared.map((comparison, index) => lineOf(review, comparison, explanation?.compared[index]));
  const headings = ["Number", "Cell", "Reported", "Recomputed", explanation === null ? "" : "As explained", "Agrees"];
  const figureArea = (row: number, rows: number) => ({
    row,
    column: figureColumns.first,
    rows,
    columns: figureColumns.count,
  });
  return section(
    [[text("Reported and recomputed")], headings.map(text), ...lines.map(({ cells }) => cells)],
    [
      acrossReview(0, "heading"),
      { area: { row: 1, column: 0, rows: 1, columns: reviewColumns }, style: "table heading", heads: lines.length },
      { area: figureArea(1, 1), align: "right", numberFormat: numberHeadingFormat },
      { area: { row: 2, column: 0, rows: Math.max(1, lines.length), columns: 1 }, style: "label" },
      { area: figureArea(2, Math.max(1, lines.length)), align: "right" },
      { area: { row: 1, column: reviewColumns - 1, rows: lines.length + 1, columns: 1 }, align: "left", indent: 1 },
      ...lines.flatMap(({ formats }, index) => formats.map((format) => atRow(format, index + 2))),
    ],
    compared.flatMap(({ reported }, index) => linkTo(index + 2, 1, reported.cell)),
  );
}

interface Line {
  readonly cells: readonly PlanCell[];
  /** On row 0. */
  readonly formats: readonly PlanFormat[];
}

const atRow = (format: PlanFormat, row: number): PlanFormat => ({ ...format, area: { ...format.area, row } });

function lineOf({ claim }: ClaimReview, comparison: Comparison, explained: Comparison | undefined): Line {
  const { reported, recomputed, agrees } = comparison;
  const figures: readonly (readonly [number | null, ShownDigits] | null)[] = [
    [reported.value, digitsShown(reported)],
    [recomputed, digitsFor(comparison)],
    explained === undefined ? null : [explained.recomputed, digitsFor(explained)],
  ];
  const formats = figures.flatMap((figure, index): PlanFormat[] =>
    figure === null || figure[0] === null
      ? []
      : [
          {
            area: { row: 0, column: figureColumns.first + index, rows: 1, columns: 1 },
            numberFormat: fitting(figure[0], figure[1]),
          },
        ],
  );
  return {
    cells: [
      text(quantityInWords(reported.quantity, namesOfDrivers(claim))),
      null,
      ...figures.map((figure) =>
        figure === null ? null : figure[0] === null ? text("not to be had") : number(figure[0]),
      ),
      text(agrees ? "agrees" : "differs"),
    ],
    formats,
  };
}

/** What has room in a column of figures; longer ones are left to the host, which shows the digits that fit. */
const mostCharacters = 13;

const fitting = (value: number, digits: ShownDigits): string =>
  showWith(digits, value).length > mostCharacters ? "General" : formatLike(digits);

/** Blank of a bracket's width behind a number, as in the headings above it. */
const room = "_)";

function formatLike({ percent, scientific, grouped, decimals }: ShownDigits): string {
  const digits = `${grouped ? "#,##0" : "0"}${decimals === 0 ? "" : `.${"0".repeat(decimals)}`}`;
  return `${digits}${scientific ? "E+00" : percent}${room}`;
}
