import { type Changes, type Keeping, type Kept, keeping } from "./candidate.ts";
import type { Change } from "./change.ts";
import type { Recipe } from "./recipe.ts";
import type { Sieve, SummedUp } from "./sieve.ts";
import type { Bench } from "./trial.ts";

/** One stage of a search: changes that cost about the same. */
export interface Stage {
  readonly step: string;
  readonly inPairs: boolean;
  /** Says after every few looks what share of the stage is done. */
  readonly looks: Generator<number, Kept>;
}

/** Every change alone: first the few, then those of which there is one a row. */
export const looksAlone = (bench: Bench, changes: Changes, sieve: Sieve): Stage[] => [
  { step: "Trying changes one by one", inPairs: false, looks: alone(bench, changes.few, sieve) },
  { step: "Trying each row", inPairs: false, looks: alone(bench, changes.many, sieve) },
];

export const looksInPairs = (bench: Bench, changes: Changes, sieve: Sieve): Stage[] => {
  const few = changes.few.filter(({ inPairs }) => inPairs);
  return [
    { step: "Trying changes in pairs", inPairs: true, looks: pairs(bench, { few, many: [] }, sieve) },
    {
      step: "Trying each row with other changes",
      inPairs: true,
      looks: pairs(bench, { few, many: changes.many }, sieve),
    },
  ];
};

/** Looks between two pauses. */
const looksAtOnce = 2000;

function* alone(bench: Bench, changes: readonly Change[], sieve: Sieve): Generator<number, Kept> {
  const keeper = keeping(sieve);
  const base = sieve.sumUp(bench.claimed, true);
  for (const [index, change] of changes.entries()) {
    const recipe = change.apply(bench.claimed);
    if (recipe === null) continue;
    const summed = change.part === "lines" ? sieve.sumUp(recipe, false) : base;
    keeper.look([change], summed, recipe);
    if (change.part === "lines" || index % looksAtOnce === 0) yield index / changes.length;
  }
  return keeper.kept();
}

/** Changes that may go together after one change of lines, or none. */
interface Grounds {
  readonly ground: Change | null;
  readonly recipe: Recipe;
  readonly summed: SummedUp;
}

/**
 * Each change of lines is summed up once and looked at with every change of rows and model; two changes of lines are
 * summed up together. Where there are many, they are the second of every pair, and the few are done already.
 */
function* pairs(bench: Bench, { few, many }: Changes, sieve: Sieve): Generator<number, Kept> {
  const keeper = keeping(sieve);
  const lines = few.filter(({ part }) => part === "lines");
  const others = few.filter(({ part }) => part !== "lines");
  const plain = { ground: null, recipe: bench.claimed, summed: sieve.sumUp(bench.claimed, true) };
  const steps = lines.length + others.length;
  for (const [index, other] of others.entries()) {
    const seconds = many.length > 0 ? many : others.slice(index + 1);
    yield* twice(plain, { first: other, seconds, share: index / steps }, { sieve, keeper });
  }
  for (const [index, line] of lines.entries()) {
    const recipe = line.apply(bench.claimed);
    if (recipe === null) continue;
    const grounds = { ground: line, recipe, summed: sieve.sumUp(recipe, false) };
    const share = (others.length + index) / steps;
    yield* twice(grounds, { first: null, seconds: many.length > 0 ? many : others, share }, { sieve, keeper });
    if (many.length === 0) yield* linesTogether(grounds, { lines: lines.slice(index + 1), share }, { sieve, keeper });
  }
  return keeper.kept();
}

interface Looking {
  readonly sieve: Sieve;
  readonly keeper: Keeping;
}

/** One change (or the ground's own) with each of many others. */
function* twice(
  { ground, recipe, summed }: Grounds,
  {
    first,
    seconds,
    share,
  }: { readonly first: Change | null; readonly seconds: readonly Change[]; readonly share: number },
  { keeper }: Looking,
): Generator<number> {
  const begun = first === null ? recipe : first.apply(recipe);
  if (begun === null) return;
  const before = [ground, first].filter((change) => change !== null);
  for (const [index, second] of seconds.entries()) {
    const both = second.apply(begun);
    if (both !== null) keeper.look([...before, second], summed, both);
    if (index % looksAtOnce === 0) yield share;
  }
}

function* linesTogether(
  { ground, recipe }: Grounds,
  { lines, share }: { readonly lines: readonly Change[]; readonly share: number },
  { sieve, keeper }: Looking,
): Generator<number> {
  for (const line of lines) {
    const both = line.apply(recipe);
    if (both === null || ground === null) continue;
    keeper.look([ground, line], sieve.sumUp(both, false), both);
    yield share;
  }
}
