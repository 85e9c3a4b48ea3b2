import type { ErrorsChoice } from "../../src/core/covariance/choice.ts";
import { covarianceOf } from "../../src/core/covariance/covarianceOf.ts";
import type { Fit } from "../../src/core/fit/fit.ts";
import { inferenceOf } from "../../src/core/inference/inferenceOf.ts";
import type { Reference } from "../../src/core/inference/reference.ts";
import type { Quantity, ReportedNumber } from "../../src/core/review/claim.ts";
import type { BookCell, SheetData } from "../../src/desk/book/bookData.ts";
import { blankSheet } from "../../src/desk/book/blankSheet.ts";

/** Which figures a report gives beside its coefficients. */
export type Style = "errors" | "p-values" | "all" | "bounds";

export interface Reporting {
  readonly style: Style;
  readonly errors: ErrorsChoice;
  readonly law: Reference;
  /** Two-sided level of the bounds. */
  readonly level: number;
  /** For each claimed driver the place among the fit's drivers whose figures stand beside it; null for none. */
  readonly order: readonly (number | null)[];
}

/** A number as someone types it from a print-out: so many significant digits, the fifth decimal for shares. */
function typed(quantity: Quantity, value: number, cell: string): ReportedNumber {
  const decimals = decimalsOf(quantity, value);
  const shown = value.toFixed(decimals);
  return { quantity, value: Number(shown), halfUnit: 0.5 * 10 ** -decimals, cell: `Report!${cell}`, shown };
}

function decimalsOf({ kind }: Quantity, value: number): number {
  if (kind === "observations" || kind === "degrees-of-freedom") return 0;
  if (kind === "r-squared" || kind === "adjusted-r-squared" || kind === "p-value") return 4;
  if (kind === "ratio" || kind === "f") return 3;
  const digits = kind === "coefficient" ? 5 : 4;
  return Math.min(12, Math.max(0, digits - 1 - Math.floor(Math.log10(Math.abs(value) || 1))));
}

export function reportOf(fit: Fit, { style, errors, law, level, order }: Reporting): ReportedNumber[] {
  const covariance = covarianceOf(fit, errors);
  if (!covariance.ok) throw new Error(covariance.problem.code);
  const zero = Array.from(fit.coefficients, () => 0);
  const table = inferenceOf(fit, covariance.value, { reference: law, against: zero, level });
  const constants = fit.design.hasConstant ? 1 : 0;
  const numbers: ReportedNumber[] = [];
  const terms = [...(constants === 1 ? [null] : []), ...order.keys()];
  terms.forEach((term, row) => {
    const driver = term === null ? 0 : (order[term] ?? null);
    if (driver === null) return;
    const place = term === null ? 0 : driver + constants;
    const figures: Readonly<
      Record<Style, readonly (readonly [Quantity & { readonly term: number | null }, number])[]>
    > = {
      errors: [[{ kind: "standard-error", term }, table.standardErrors[place]!]],
      "p-values": [[{ kind: "p-value", term }, table.pValue[place]!]],
      all: [
        [{ kind: "standard-error", term }, table.standardErrors[place]!],
        [{ kind: "ratio", term }, table.ratio[place]!],
        [{ kind: "p-value", term }, table.pValue[place]!],
      ],
      bounds: [
        [{ kind: "standard-error", term }, table.standardErrors[place]!],
        [{ kind: "low", term }, table.low[place]!],
        [{ kind: "high", term }, table.high[place]!],
      ],
    };
    numbers.push(typed({ kind: "coefficient", term }, fit.coefficients[place]!, `B${row + 2}`));
    figures[style].forEach(([quantity, value], column) =>
      numbers.push(typed(quantity, value, `${"CDE"[column]!}${row + 2}`)),
    );
  });
  const below = terms.length + 3;
  numbers.push(typed({ kind: "r-squared" }, fit.rSquared, `B${below}`));
  numbers.push(typed({ kind: "observations" }, fit.rowCount, `B${below + 1}`));
  if (style !== "errors") numbers.push(typed({ kind: "sigma" }, fit.sigma, `B${below + 2}`));
  return numbers;
}

const headings: Readonly<Record<string, string>> = {
  coefficient: "Coefficient",
  "standard-error": "Standard error",
  ratio: "t ratio",
  "p-value": "p-value",
  low: "Lower 95 %",
  high: "Upper 95 %",
};

const wholes: Readonly<Record<string, string>> = {
  "r-squared": "R squared",
  observations: "Observations",
  sigma: "Standard error of the regression",
};

/** The report as a sheet of typed numbers, each in its cell, and a line that says what was explained. */
export function reportSheet(
  reported: readonly ReportedNumber[],
  outcome: string,
  drivers: readonly string[],
): SheetData {
  const rows: BookCell[][] = [["Driver"]];
  const put = (row: number, column: number, cell: BookCell): void => {
    while (rows.length <= row) rows.push([]);
    while (rows[row]!.length <= column) rows[row]!.push(null);
    rows[row]![column] = cell;
  };
  for (const { quantity, cell, value, shown } of reported) {
    const column = cell.charCodeAt("Report!".length) - 65;
    const row = Number(cell.slice("Report!".length + 1)) - 1;
    const decimals = shown.split(".")[1]?.length ?? 0;
    put(row, column, { value, style: { numberFormat: decimals === 0 ? "0" : `0.${"0".repeat(decimals)}` } });
    if ("term" in quantity) {
      put(0, column, headings[quantity.kind]!);
      put(row, 0, quantity.term === null ? "Constant" : drivers[quantity.term]!);
    } else put(row, 0, wholes[quantity.kind] ?? quantity.kind);
  }
  return blankSheet("Report", [...rows, [], [`What explains ${outcome}?`]]);
}
