import type { TermMeaning } from "../design/design.ts";
import type { Transform } from "../design/model.ts";

/**
 * How a coefficient is read aloud: the step in the driver that it is about, and the coefficient turned into
 * something a reader can picture (an amount of the outcome, or per cent of it).
 */
export interface Effect {
  /** "One more rainy day", "Price higher by 1", "1 % more Price", "Region North, compared with South," */
  readonly step: string;
  /** Turns a coefficient, or an end of its interval, into the amount that is spoken of. */
  readonly amount: (coefficient: number) => number;
  readonly words: EffectWords;
}

/** What is said around the amounts, which come as texts without a sign. */
export interface EffectWords {
  readonly up: Direction;
  readonly down: Direction;
  /** From one end of an interval to the other, each with its direction: "anything from 4.1 fewer to 1.6 more repairs a month". */
  readonly span: (from: string, to: string) => string;
}

export interface Direction {
  /** "3.1 fewer repairs a month", "Repairs lower by 3.1", "2.3 % less Repairs" */
  readonly say: (amount: string) => string;
  /** "3.1 fewer", "3.1 lower", "2.3 % less" */
  readonly short: (amount: string) => string;
  /** The nearer end of an interval, which leaves the direction to the farther one: "3.1", "2.3 %" */
  readonly near: (amount: string) => string;
}

export interface EffectSubject {
  readonly meaning: TermMeaning;
  readonly outcome: { readonly column: string; readonly transform: Transform };
  readonly units: Readonly<Record<string, string>>;
}

/** What one step in a term goes with, in the words of the units given. */
export function effectOf(subject: EffectSubject): Effect {
  const perCentOfDriver = subject.meaning.kind === "number" && subject.meaning.transform.kind === "logarithm";
  const step = stepOf(subject.meaning, subject.units);
  const { amount, words } = outcomeSide(subject);
  const scale = perCentOfDriver ? Math.log(1.01) : 1;
  return { step, amount: (coefficient) => amount(coefficient * scale), words };
}

function outcomeSide({ outcome, units }: EffectSubject): Pick<Effect, "amount" | "words"> {
  const { column, transform } = outcome;
  const unit = units[column];
  const asItIs = (change: number): number => change;
  switch (transform.kind) {
    case "logarithm":
      return { amount: (change) => 100 * Math.expm1(change), words: counted(column, ["% more", "% less"]) };
    case "growth rate":
      return {
        amount: asItIs,
        words: counted(`growth of ${column}`, ["percentage points more", "percentage points less"]),
      };
    case "none":
      return { amount: asItIs, words: unit === undefined ? measured(column) : counted(unit, ["more", "fewer"]) };
    case "change":
    case "lag":
    case "square":
      return { amount: asItIs, words: measured(`the ${transform.kind} of ${column}`) };
  }
}

/** Amounts of something that has a name: "3.1 fewer repairs a month". */
function counted(what: string, [more, less]: readonly [string, string]): EffectWords {
  const direction = (word: string): Direction => ({
    say: (amount) => `${amount} ${word} ${what}`,
    short: (amount) => `${amount} ${word}`,
    near: (amount) => (word.startsWith("%") ? `${amount} %` : amount),
  });
  return { up: direction(more), down: direction(less), span: (from, to) => `anything from ${from} to ${to} ${what}` };
}

/** Amounts of a column whose unit is not known: "Repairs lower by 3.1". */
function measured(what: string): EffectWords {
  const direction = (word: string): Direction => ({
    say: (amount) => `${what} ${word} by ${amount}`,
    short: (amount) => `${amount} ${word}`,
    near: (amount) => amount,
  });
  return {
    up: direction("higher"),
    down: direction("lower"),
    span: (from, to) => `${what} anywhere from ${from} to ${to}`,
  };
}

function stepOf(meaning: TermMeaning, units: EffectSubject["units"]): string {
  switch (meaning.kind) {
    case "constant":
      return "All drivers at zero";
    case "number":
      return numberStep(meaning.column, meaning.transform, units[meaning.column]);
    case "level":
      return `${meaning.column} ${meaning.level}, compared with ${meaning.base},`;
    case "season":
      return `${meaning.level}, compared with ${meaning.base},`;
    case "date":
    case "trend":
      return `Each further ${meaning.unit}`;
  }
}

function numberStep(column: string, transform: Transform, unit: string | undefined): string {
  switch (transform.kind) {
    case "none":
      return unit === undefined ? `${column} higher by 1` : `One more ${unit}`;
    case "logarithm":
      return `1 % more ${column}`;
    case "square":
      return `The square of ${column} higher by 1`;
    case "lag": {
      const earlier = `${transform.periods === 1 ? "one period" : `${transform.periods} periods`} earlier`;
      return unit === undefined ? `${column} higher by 1, ${earlier},` : `One more ${unit}, ${earlier},`;
    }
    case "change":
      return `The change of ${column} higher by 1`;
    case "growth rate":
      return `One percentage point more growth of ${column}`;
  }
}
