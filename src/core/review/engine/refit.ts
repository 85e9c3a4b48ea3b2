import { buildDesign } from "../../design/buildDesign.ts";
import type { RowsAre } from "../../design/model.ts";
import type { Fit } from "../../fit/fit.ts";
import { fitLeastSquares } from "../../fit/fitLeastSquares.ts";
import type { Result } from "../../problem/result.ts";
import { type CellColumn, cellKind } from "../../table/cells.ts";
import { distinctNames } from "../../table/headings.ts";
import type { Column } from "../../table/source.ts";
import type { ClaimedLine } from "../claim.ts";
import { type Frame, positionOf } from "./frame.ts";
import type { Recipe } from "./recipe.ts";
import { type Listed, listRows } from "./rowList.ts";

/** What the rows are taken to be to each other: by a line beside the data, or as they stand. */
export type Order =
  | { readonly kind: "cases" }
  | { readonly kind: "time"; readonly by: ClaimedLine | null }
  | { readonly kind: "groups"; readonly by: ClaimedLine };

/**
 * The regression that a recipe describes, by the same rooms that answer every question.
 * @returns Problems of the design and the fit; null where a row counted in has no value.
 */
export function refit(frame: Frame, recipe: Recipe, order: Order): Result<Fit> | null {
  const listed = listRows(frame, recipe);
  if (listed === null) return null;
  const { outcome, drivers, constant } = recipe.model;
  const key = order.kind === "cases" ? null : order.by;
  const used = [outcome, ...drivers].map((index) => frame.lines[index]!.line);
  const named = distinctNames([...used, ...(key === null ? [] : [key])].map(({ name }, at) => naming(name, at)));
  const columns = [outcome, ...drivers].map((index, at) => numberColumn(named[at]!, listed.columns[index]!));
  const keys = key === null ? [] : [keyColumn(named.at(-1)!, key, { frame, listed })];
  const design = buildDesign(
    { columns: [...columns, ...keys], rowCount: listed.rows.length },
    {
      outcome: { column: named[0]!, transform: { kind: "none" } },
      drivers: columns.slice(1).map(({ name: column }) => ({ column, as: "number", base: null, transform })),
      calendar: [],
      rows: rowsAre(order, named.at(-1)!),
      constant,
      textNumbers: [],
    },
  );
  return design.ok ? fitLeastSquares(design.value) : design;
}

const transform = { kind: "none" } as const;

const naming = (heading: string, at: number) => ({ heading, where: `line ${at + 1}` });

const rowsAre = ({ kind, ...order }: Order, name: string): RowsAre => {
  switch (kind) {
    case "cases":
      return { kind };
    case "time":
      return { kind, order: "by" in order && order.by !== null ? name : null };
    case "groups":
      return { kind, by: name, second: null, order: null };
  }
};

const place = (column: number) => ({ kind: "argument", argument: "the review", column, firstRow: 0 }) as const;

const numberColumn = (name: string, numbers: Float64Array<ArrayBuffer>): Column => ({
  name,
  place: place(0),
  cells: { kinds: new Uint8Array(numbers.length).fill(cellKind.number), numbers, texts: [] },
});

interface Laid {
  readonly frame: Frame;
  readonly listed: Listed;
}

/** The cells of a line beside the rows that are listed; rows that stand nowhere have a blank one. */
function keyColumn(name: string, key: ClaimedLine, { frame, listed }: Laid): Column {
  const outcome = frame.lines[0]!;
  const kinds = new Uint8Array(listed.rows.length);
  const numbers = new Float64Array(listed.rows.length);
  listed.rows.forEach((row, at) => {
    const cell = row < 0 ? -1 : positionOf(outcome, row, frame) - key.first;
    kinds[at] = key.cells.kinds[cell] ?? cellKind.blank;
    numbers[at] = key.cells.numbers[cell] ?? 0;
  });
  const cells: CellColumn = { kinds, numbers, texts: key.cells.texts };
  return { name, place: place(1), cells };
}
