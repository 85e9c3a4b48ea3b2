import { type Changes, type Keeping, type Kept, keeping } from "./candidate.ts";
import type { Change } from "./change.ts";
import type { Recipe } from "./recipe.ts";
import type { Sieve } from "./sieve.ts";
import type { SummedUp } from "./summedUp.ts";
import type { Bench } from "./trial.ts";

/** One stage of a search: changes that cost about the same. */
export interface Stage {
  readonly step: string;
  readonly inPairs: boolean;
  /** Says after every few looks what share of the stage is done. */
  readonly looks: Generator<number, Kept>;
}

/** Every change alone: first the few, then those of which there is one a row. */
export const looksAlone = (bench: Bench, changes: Changes, sieve: Sieve): Stage[] => {
  const grounds = { change: null, recipe: bench.claimed, summed: sieve.sumUp(bench.claimed) };
  return [
    { step: "Trying changes one by one", inPairs: false, looks: alone(grounds, changes.few, sieve) },
    {
      step: "Trying each row",
      inPairs: false,
      looks: alone(grounds, changes.many, sieve),
    },
  ];
};

export const looksInPairs = (bench: Bench, changes: Changes, sieve: Sieve): Stage[] => {
  const few = changes.few.filter(({ inPairs }) => inPairs);
  return [
    { step: "Trying changes in pairs", inPairs: true, looks: fewInPairs(bench, few, sieve) },
    {
      step: "Trying each row with other changes",
      inPairs: true,
      looks: manyInPairs(bench, { ...changes, few }, sieve),
    },
  ];
};

/** Looks between two pauses. */
const looksAtOnce = 2000;

function* alone(base: Grounds, changes: Iterable<Change>, sieve: Sieve): Generator<number, Kept> {
  const keeper = keeping(sieve);
  let index = 0;
  for (const change of changes) {
    const recipe = change.apply(base.recipe);
    if (recipe === null) continue;
    const survivor = keeper.look(change.part === "lines" ? sieve.sumUp(recipe) : base.summed, recipe);
    if (survivor !== null) keeper.keep([change], survivor);
    if (change.part === "lines" || index++ % looksAtOnce === 0) yield 0.5;
  }
  return keeper.kept();
}

/** A recipe summed up, after one change of lines or none: changes of rows and model cost no pass over the rows then. */
interface Grounds {
  readonly change: Change | null;
  readonly recipe: Recipe;
  readonly summed: SummedUp;
}

/** The claimed cells, then each change of lines; one at a time, because sums over all rows are large. */
function* groundsOf(bench: Bench, few: readonly Change[], sieve: Sieve): Generator<Grounds> {
  yield { change: null, recipe: bench.claimed, summed: sieve.sumUp(bench.claimed) };
  for (const change of few) {
    const recipe = change.part === "lines" ? change.apply(bench.claimed) : null;
    if (recipe !== null) yield { change, recipe, summed: sieve.sumUp(recipe) };
  }
}

/** Every two of the few. */
function* fewInPairs(bench: Bench, few: readonly Change[], sieve: Sieve): Generator<number, Kept> {
  const keeper = keeping(sieve);
  const lines = few.filter(({ part }) => part === "lines");
  const others = few.filter(({ part }) => part !== "lines");
  let done = 0;
  for (const grounds of groundsOf(bench, few, sieve)) {
    const share = done++ / (lines.length + 1);
    if (grounds.change === null) {
      for (const [index, first] of others.entries()) {
        yield* each(grounds, { first, seconds: others.slice(index + 1), share }, keeper);
      }
    } else {
      yield* each(grounds, { first: null, seconds: others, share }, keeper);
      const later = lines.slice(lines.indexOf(grounds.change) + 1);
      yield* linesTogether(grounds, { lines: later, share }, { sieve, keeper });
    }
  }
  return keeper.kept();
}

/** Each of the few with each of the many. */
function* manyInPairs(bench: Bench, { few, manyMore }: Changes, sieve: Sieve): Generator<number, Kept> {
  const keeper = keeping(sieve);
  const others = few.filter(({ part }) => part !== "lines");
  let done = 0;
  for (const grounds of groundsOf(bench, few, sieve)) {
    const complete = grounds.summed.complete();
    for (const first of grounds.change === null ? others : [null]) {
      const begun = first === null ? grounds.recipe : first.apply(grounds.recipe);
      const seconds = begun === null ? [] : manyMore(begun, complete);
      yield* each(grounds, { first, seconds, share: done++ / few.length }, keeper);
    }
  }
  return keeper.kept();
}

interface Following {
  readonly first: Change | null;
  readonly seconds: Iterable<Change>;
  readonly share: number;
}

/** One change, or the ground's own, with each of many others. */
function* each(
  { change, recipe, summed }: Grounds,
  { first, seconds, share }: Following,
  keeper: Keeping,
): Generator<number> {
  const begun = first === null ? recipe : first.apply(recipe);
  if (begun === null) return;
  const before = [change, first].filter((one) => one !== null);
  let index = 0;
  for (const second of seconds) {
    const both = second.inPairs ? second.apply(begun) : null;
    const survivor = both === null ? null : keeper.look(summed, both);
    if (survivor !== null) keeper.keep([...before, second], survivor);
    if (index++ % looksAtOnce === 0) yield share;
  }
}

interface Looking {
  readonly sieve: Sieve;
  readonly keeper: Keeping;
}

function* linesTogether(
  { change, recipe }: Grounds,
  { lines, share }: { readonly lines: readonly Change[]; readonly share: number },
  { sieve, keeper }: Looking,
): Generator<number> {
  for (const line of lines) {
    const both = line.apply(recipe);
    if (both === null || change === null) continue;
    const survivor = keeper.look(sieve.sumUpOnce(both), both);
    if (survivor !== null) keeper.keep([change, line], survivor);
    yield share;
  }
}
