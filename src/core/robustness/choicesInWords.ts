import type { ErrorsChoice } from "../covariance/choice.ts";
import type { Reference } from "../inference/reference.ts";

/** A choice by its names. */
export interface ChoiceName {
  readonly kind: ErrorsChoice["kind"];
  /** "HC3", "CR2"; null for the other kinds. */
  readonly version: string | null;
  /** null but for Newey-West. */
  readonly lags: number | null;
  readonly law: Reference["law"];
}

const kinds: readonly ErrorsChoice["kind"][] = ["classical", "white", "newey-west", "grouped"];
const kindName = { classical: "classical", white: "White", "newey-west": "Newey-West", grouped: "grouped" } as const;
const lawNames = { t: "the t", normal: "the normal", "fixed-b": "the fixed-b" } as const;

/**
 * The choices in words, alike ones together: "classical", "White", "White (HC0, HC1)", "Newey-West with 0 to 3 lags",
 * and with the distribution where only some of a kind's are meant.
 * @param some - the choices to name.
 * @param all - every choice there is, so that what all laws of a kind share is said without naming them.
 */
export function choicesInWords(some: readonly ChoiceName[], all: readonly ChoiceName[]): string[] {
  return kinds.flatMap((kind) => {
    const laws = lawsOf(all, kind);
    const byMembers = new Map<string, ChoiceName["law"][]>();
    for (const law of laws) {
      const members = membersInWords(kind, law, { some, all });
      if (members !== null) byMembers.set(members, [...(byMembers.get(members) ?? []), law]);
    }
    return [...byMembers].map(([members, under]) =>
      under.length === laws.length
        ? members
        : `${members} read against ${under.map((law) => lawNames[law]).join(" or ")} distribution`,
    );
  });
}

const lawsOf = (choices: readonly ChoiceName[], kind: ChoiceName["kind"]): ChoiceName["law"][] => [
  ...new Set(choices.filter((choice) => choice.kind === kind).map(({ law }) => law)),
];

interface Named {
  readonly some: readonly ChoiceName[];
  readonly all: readonly ChoiceName[];
}

/** Which members of a kind are meant under one law; null where none is. */
function membersInWords(kind: ChoiceName["kind"], law: ChoiceName["law"], { some, all }: Named): string | null {
  const under = (choices: readonly ChoiceName[]): ChoiceName[] =>
    choices.filter((choice) => choice.kind === kind && choice.law === law);
  const [meant, every] = [under(some), under(all)];
  if (meant.length === 0) return null;
  const name = kindName[kind];
  if (kind === "classical") return name;
  if (kind === "newey-west") return `${name} with ${inLags(lagRanges(meant, every))}`;
  if (meant.length === every.length) return name;
  const versions = [...new Set(meant.map(({ version }) => version))];
  return `${name} (${versions.join(", ")})`;
}

const inLags = (ranges: string): string => (ranges === "1" ? "1 lag" : `${ranges} lags`);

/** "0 to 3 or 7", where the lags named stand next to one another on the ladder. */
function lagRanges(meant: readonly ChoiceName[], every: readonly ChoiceName[]): string {
  const ladder = every.map(({ lags }) => lags);
  const named = new Set(meant.map(({ lags }) => lags));
  const ranges: (number | null)[][] = [];
  ladder.forEach((lags, rung) => {
    if (!named.has(lags)) return;
    if (rung > 0 && named.has(ladder[rung - 1]!)) ranges.at(-1)![1] = lags;
    else ranges.push([lags]);
  });
  const words = ranges.map((range) => range.join(" to "));
  return words.length < 2 ? words.join("") : `${words.slice(0, -1).join(", ")} or ${words.at(-1)!}`;
}
