import type { Claim, ClaimedLine, Quantity, ReportedNumber } from "../../src/core/review/claim.ts";
import { reviewClaim } from "../../src/core/review/reviewClaim.ts";
import type { Cell } from "../../src/core/table/cells.ts";
import { type Size, questionOf } from "./data.ts";
import { toCellColumn } from "../support/cellColumns.ts";

/**
 * A report that nothing explains, so that every change is tried, alone and in pairs: typed coefficients that never came
 * out of any regression, over data with a few blanks, words and numbers kept as text.
 * @param says - whether the report says how many rows it used, which spares the search most blocks of rows.
 */
export const reviewJob =
  (says: readonly Quantity["kind"][]) =>
  (size: Size): (() => void) => {
    const claim = claimOf(size, says);
    return () => {
      const { tried } = reviewClaim(claim, () => undefined);
      if (tried.length === 0) throw new Error("something explained a report that was made up");
    };
  };

function claimOf(size: Size, says: readonly Quantity["kind"][]): Claim {
  const { source } = questionOf(size);
  const odd = new Map<number, Cell>([
    [100, null],
    [200, "n/a"],
    [300, "1,234"],
  ]);
  const lines = source.columns.map(({ name, cells }, track): ClaimedLine => {
    const numbers = [...cells.numbers].map((number, row) => (track === 1 ? (odd.get(row) ?? number) : number));
    return {
      name,
      sheet: "Bench",
      runs: "down",
      track,
      first: 0,
      cells: toCellColumn([name, ...numbers]),
      from: 1,
      count: size.rows,
      form: "as it is",
      hidden: [],
    };
  });
  const typed = (quantity: Quantity, value: number): ReportedNumber => {
    const number = { quantity, value, halfUnit: 0.00005, cell: "Report!B2", shown: value.toFixed(4) };
    return quantity.kind === "observations" ? { ...number, halfUnit: 0.5 } : number;
  };
  const coefficients = lines.slice(1).map((_, term) => typed({ kind: "coefficient", term }, 1.2345 + 0.6789 * term));
  const rows = says.includes("observations") ? [typed({ kind: "observations" }, size.rows - 12)] : [];
  const errors = lines.slice(1).map((_, term) => typed({ kind: "standard-error", term }, 0.0123));
  return {
    place: "Report!A1:B9",
    origin: { kind: "typed" },
    outcome: lines[0]!,
    drivers: lines.slice(1),
    constant: true,
    reported: [...coefficients, ...errors, typed({ kind: "r-squared" }, 0.4321), ...rows],
    others: [],
  };
}
