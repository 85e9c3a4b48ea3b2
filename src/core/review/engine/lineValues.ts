import { sense } from "../../table/senses.ts";
import { formOf } from "../forms.ts";
import type { Frame, FrameLine } from "./frame.ts";
import type { LineRecipe, Run } from "./recipe.ts";

/** One value a row of the frame, and a byte that is 1 where there is one. */
export interface LineValues {
  readonly values: Float64Array<ArrayBuffer>;
  readonly present: Uint8Array<ArrayBuffer>;
}

/** A line's numbers as a recipe makes them: read, shifted, transformed, turned into changes, sorted. */
export function lineValues(line: FrameLine, recipe: LineRecipe, frame: Frame): LineValues {
  const claimed = { from: frame.first, to: frame.first + frame.count };
  const taken = shifted(read(line, recipe), recipe, claimed);
  transform(taken, recipe.form);
  const made = recipe.changes ? changes(taken, claimed) : taken;
  if (recipe.sorted !== "as it stands") sort(made, recipe.sorted, claimed);
  return made;
}

function read({ senses, numbers }: FrameLine, { blanks, texts, textNumbers }: LineRecipe): LineValues {
  const taken = new Uint8Array(8);
  taken[sense.number] = taken[sense.date] = taken[sense.boolean] = asItIs;
  if (blanks === "zero") taken[sense.blank] = asZero;
  if (texts === "zero") taken[sense.text] = taken[sense.mark] = asZero;
  if (textNumbers !== "left out") taken[sense.textNumber] = textNumbers === "read" ? asItIs : asZero;
  const present = senses.map((one) => (taken[one] === 0 ? 0 : 1));
  const values = numbers.map((number, row) => (taken[senses[row]!] === asItIs ? number : 0));
  return { values, present };
}

const asItIs = 1;
const asZero = 2;

function shifted(line: LineValues, { shift, beyond }: LineRecipe, { from, to }: Run): LineValues {
  if (shift === 0) return line;
  const rows = line.values.length;
  const values = new Float64Array(rows);
  const present = new Uint8Array(rows);
  const [least, most] = beyond ? [0, rows] : [from, to];
  for (let row = 0; row < rows; row++) {
    const other = row + shift;
    if (other < least || other >= most) continue;
    values[row] = line.values[other]!;
    present[row] = line.present[other]!;
  }
  return { values, present };
}

const forms: Readonly<Record<LineRecipe["form"], (value: number) => number>> = {
  ...formOf,
  "base-10 logarithm": Math.log10,
};

/** A value without a form, as zero has no logarithm, is missing. */
function transform({ values, present }: LineValues, form: LineRecipe["form"]): void {
  if (form === "as it is") return;
  const made = forms[form];
  for (let row = 0; row < values.length; row++) {
    const value = made(values[row]!);
    if (!Number.isFinite(value)) present[row] = 0;
    values[row] = Number.isFinite(value) ? value : 0;
  }
}

/** From the row before; the first claimed row has none. */
function changes({ values, present }: LineValues, { from }: Run): LineValues {
  const differences = values.map((value, row) => (row === 0 ? 0 : value - values[row - 1]!));
  const both = present.map((byte, row) => (row === 0 || row === from ? 0 : byte & present[row - 1]!));
  return { values: differences, present: both };
}

function sort({ values, present }: LineValues, order: LineRecipe["sorted"], { from, to }: Run): void {
  const rows: number[] = [];
  for (let row = from; row < to; row++) if (present[row] === 1) rows.push(row);
  const ordered = Float64Array.from(rows, (row) => values[row]!).sort();
  if (order === "descending") ordered.reverse();
  rows.forEach((row, place) => (values[row] = ordered[place]!));
}

/** What a form makes of a number that stands in no cell: a zero counted in, a total. Null where it makes none. */
export function formed(value: number, form: LineRecipe["form"]): number | null {
  const made = forms[form](value);
  return Number.isFinite(made) ? made : null;
}
