import { type Result, success } from "../problem/result.ts";
import type { TermMeaning } from "./design.ts";
import { type Ingredient, gather } from "./ingredient.ts";
import type { Transform } from "./model.ts";
import { type LookBack, type NumberColumn, transformed } from "./transforms.ts";

/** What is made of a column of numbers: its transform, and what a step in the plain column means. */
export interface NumberUse {
  readonly transform: Transform;
  /** Used where there is no transform; a transform always speaks of the column itself. */
  readonly plainly: TermMeaning;
}

/** A driver of numbers, or of dates counted as numbers, after its transform: one term. */
export function numberDriver(
  source: NumberColumn,
  { transform, plainly }: NumberUse,
  lookBack: LookBack | null,
): Result<Ingredient> {
  const made = transformed(source, transform, lookBack);
  if (!made.ok) return made;
  const { values, present, lackOf, name } = made.value;
  const meaning: TermMeaning =
    transform.kind === "none" ? plainly : { kind: "number", column: source.column.name, transform };
  return success({
    present,
    lackOf,
    terms: (rows) => success([{ name, meaning, values: gather(values, rows) }]),
    notes: source.numbers.notes,
  });
}
