import { sense } from "../../table/senses.ts";
import { standsInCells } from "../forms.ts";
import type { Change, Facts } from "./change.ts";
import type { Frame } from "./frame.ts";
import { type LineRecipe, type Recipe, withLines } from "./recipe.ts";

/** Further shifts than these are not tried alone, and not in pairs. */
const farthestShift = 6;
const farthestInPairs = 2;

/** The changes of what is made of a line's cells: how they are read, shifted, transformed, ordered. */
export function lineChanges(frame: Frame): Change[] {
  const every = Array.from({ length: frame.driverCount + 1 }, (_, line) => line);
  const claimed = every.filter((line) => standsInCells(frame.lines[line]!.line));
  const sets = setsOf(claimed);
  return [
    ...readings(frame, sets),
    ...shifts(frame, claimed),
    ...sets.flatMap((lines) => logarithms(frame, lines)),
    ...[claimed, [0]].map((lines) => lineChange({ hypothesis: "changes", lines }, { changes: true })),
    ...claimed.flatMap((line) =>
      (["ascending", "descending"] as const).map((order) =>
        lineChange({ hypothesis: "sorted-alone", line, order }, { sorted: order }),
      ),
    ),
  ];
}

/** Each line alone, the drivers together, all together. */
function setsOf(claimed: readonly number[]): (readonly number[])[] {
  const single = claimed.map((line) => [line]);
  const drivers = claimed.slice(1);
  return [...single, ...(drivers.length > 1 ? [drivers] : []), claimed];
}

type LineFacts = Extract<Facts, { lines: readonly number[] } | { hypothesis: "sorted-alone" }>;

function lineChange(facts: LineFacts, changed: Partial<LineRecipe>, inPairs = true): Change {
  const lines = "lines" in facts ? facts.lines : [facts.line];
  const isNew = (recipe: Recipe): boolean =>
    lines.every((line) =>
      Object.entries(changed).some(([key, value]) => recipe.lines[line]![key as keyof LineRecipe] !== value),
    );
  return {
    facts,
    part: "lines",
    inPairs,
    apply: (recipe) => (isNew(recipe) ? withLines(recipe, lines, changed) : null),
  };
}

/** How blanks, words and text numbers are read, in the lines that have any. */
function readings(frame: Frame, sets: readonly (readonly number[])[]): Change[] {
  return kinds.flatMap(({ hypothesis, senses, changed }) => {
    const having = (line: number): boolean => holds(frame, line, senses);
    const some = sets.map((lines) => lines.filter(having)).filter((lines) => lines.length > 0);
    const distinct = new Map(some.map((lines) => [lines.join(), lines]));
    return [...distinct.values()].map((lines) => lineChange({ hypothesis, lines }, changed));
  });
}

const kinds = [
  { hypothesis: "empty-cells-as-zero", senses: [sense.blank], changed: { blanks: "zero" } },
  { hypothesis: "text-as-zero", senses: [sense.text, sense.mark], changed: { texts: "zero" } },
  { hypothesis: "text-numbers-read", senses: [sense.textNumber], changed: { textNumbers: "read" } },
  { hypothesis: "text-numbers-as-zero", senses: [sense.textNumber], changed: { textNumbers: "zero" } },
] as const;

function holds({ lines, first, count }: Frame, line: number, wanted: readonly number[]): boolean {
  const { senses } = lines[line]!;
  for (let row = first; row < first + count; row++) if (wanted.includes(senses[row]!)) return true;
  return false;
}

/** The outcome against all drivers, and each of several drivers against the rest. */
function shifts(frame: Frame, claimed: readonly number[]): Change[] {
  const alone = claimed.length > 2 ? claimed : [0];
  const sizes = Array.from({ length: farthestShift }, (_, i) => i + 1).flatMap((size) => [-size, size]);
  return alone.flatMap((line) =>
    sizes.flatMap((shift) =>
      [false, true]
        .filter((beyond) => !beyond || reaches(frame, line, shift))
        .map((beyond) =>
          lineChange(
            { hypothesis: "shifted", lines: [line], shift, beyond },
            { shift, beyond },
            Math.abs(shift) <= farthestInPairs,
          ),
        ),
    ),
  );
}

/** Whether a shift meets a number beyond the claimed cells. */
function reaches({ lines, first, count, rowCount }: Frame, line: number, shift: number): boolean {
  const { senses } = lines[line]!;
  const [from, to] = shift > 0 ? [first + count, first + count + shift] : [first + shift, first];
  for (let row = Math.max(0, from); row < Math.min(rowCount, to); row++) if (senses[row] === sense.number) return true;
  return false;
}

function logarithms(frame: Frame, lines: readonly number[]): Change[] {
  const forms = lines.map((line) => frame.lines[line]!.line.form);
  const base10 = lineChange({ hypothesis: "base-10-logarithm", lines }, { form: "base-10 logarithm" });
  if (forms.every((form) => form === "as it is")) {
    return [lineChange({ hypothesis: "logarithm", lines }, { form: "logarithm" }), base10];
  }
  if (!forms.every((form) => form === "logarithm")) return [];
  return [lineChange({ hypothesis: "no-logarithm", lines }, { form: "as it is" }), base10];
}
