import type { ColumnSetup } from "../../app/setup.ts";
import type { ColumnDescription } from "../../core/table/describe.ts";
import { readTextNumber } from "../../core/table/textNumbers.ts";

const count = (number: number, one: string, many: string): string =>
  `${number.toLocaleString("en-US")} ${number === 1 ? one : many}`;

/** What a column holds, in a few words: "94 numbers", "dates, monthly", "5 categories". */
export function holdsInWords({ holds, counts, distinct, unusable, counter, constant }: ColumnDescription): string {
  switch (holds) {
    case "numbers": {
      const found = count(counts.numbers, "number", "numbers");
      return counter ? `${found} that count the rows` : constant ? `${found}, all the same` : found;
    }
    case "dates":
    case "periods":
      return count(counts.rows - unusable.count, holds === "dates" ? "date" : "period", holds);
    case "categories":
      return count(distinct, "category", "categories");
    case "text":
      return `text, ${distinct.toLocaleString("en-US")} different`;
    case "mixed":
      return "a mixture";
    case "nothing":
      return "nothing";
  }
}

/** The cells of a column that cannot be used under its set-up: text that may be read as numbers can. */
export function unusableCells({ unusable, textNumbers }: ColumnDescription, setup: ColumnSetup): Unusable {
  const decimal = setup.textNumbers;
  const agreed = decimal === null ? 0 : (textNumbers?.count ?? 0);
  const cells = unusable.cells.map((address, index) => ({ address, value: unusable.values[index] ?? "" }));
  const shown = decimal === null ? cells : cells.filter(({ value }) => readTextNumber(value, decimal) === null);
  return { cells: shown, count: Math.max(unusable.count - agreed, shown.length) };
}

export interface Unusable {
  readonly cells: readonly { readonly address: string; readonly value: string }[];
  readonly count: number;
}
