import type { TermMeaning } from "../design/design.ts";
import type { Transform } from "../design/model.ts";

/**
 * How a coefficient is read aloud: the step in the driver that it is about, and the coefficient turned into
 * something a reader can picture (an amount of the outcome, or per cent of it).
 */
export interface Effect {
  /** "One more rainy day", "1 % more Price", "Region North, compared with South," */
  readonly step: string;
  /** Turns a coefficient, or an end of its interval, into the amount that is spoken of. */
  readonly amount: (coefficient: number) => number;
  /** "fewer repairs a month", "less in Repairs", "% less Repairs": the words behind the amount. */
  readonly words: { readonly up: string; readonly down: string };
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
  switch (transform.kind) {
    case "logarithm":
      return {
        amount: (change) => 100 * Math.expm1(change),
        words: { up: `% more ${column}`, down: `% less ${column}` },
      };
    case "growth rate":
      return {
        amount: (change) => change,
        words: { up: `percentage points more growth of ${column}`, down: `percentage points less growth of ${column}` },
      };
    case "none":
      return {
        amount: (change) => change,
        words:
          unit === undefined
            ? { up: `more in ${column}`, down: `less in ${column}` }
            : { up: `more ${unit}`, down: `fewer ${unit}` },
      };
    case "change":
    case "lag":
    case "square":
      return {
        amount: (change) => change,
        words: { up: `more in the ${transform.kind} of ${column}`, down: `less in the ${transform.kind} of ${column}` },
      };
  }
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
  const oneMore = unit === undefined ? `One more in ${column}` : `One more ${unit}`;
  switch (transform.kind) {
    case "none":
      return oneMore;
    case "logarithm":
      return `1 % more ${column}`;
    case "square":
      return `One more in the square of ${column}`;
    case "lag":
      return `${oneMore} ${transform.periods === 1 ? "one period" : `${transform.periods} periods`} earlier`;
    case "change":
      return `One more in the change of ${column}`;
    case "growth rate":
      return `One percentage point more growth of ${column}`;
  }
}
