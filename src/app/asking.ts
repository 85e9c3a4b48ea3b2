import type { Answer } from "../core/answer/answer.ts";
import { readEstimates, readJointTest } from "../core/answer/readAsked.ts";
import { readExpressions } from "../core/answer/settingReaders.ts";
import type { Problem } from "../core/problem/problem.ts";
import type { Setup } from "./setup.ts";
import type { Answered } from "./state.ts";

/** What can be asked of the coefficients beside one sentence a driver. */
export type Asked = Pick<Setup["options"], "estimates" | "jointTest">;

const readers = { estimates: readEstimates, jointTest: readJointTest } as const;

/**
 * Reads what was typed to be asked, with the coefficients of the answer shown.
 * @returns what is wrong with it. Where the set-up has changed since that answer its coefficients may be others: nothing
 *   is found wrong here then, and the next answer tells.
 */
export function readAsked(
  kind: keyof Asked,
  typed: string,
  answered: Answered | null,
): { readonly texts: readonly string[]; readonly problem: Problem | null } {
  const texts = readExpressions(typed);
  if (answered === null || answered.outdated?.because === "set-up") return { texts, problem: null };
  const read = readers[kind](answered.answer.askable, texts);
  return { texts, problem: read.ok ? null : read.problem };
}

/** Something that could be asked: in words, and as it is typed. */
export interface Example {
  readonly words: string;
  readonly typed: string;
}

/** Examples made of the drivers of an answer: of numbers to be estimated, and of equations to be tested at once. */
export function examplesFor({ drivers, outcome }: Pick<Answer, "drivers" | "outcome">): Examples {
  const names = drivers.flatMap(({ term, sentence }) => (sentence === null || term.includes('"') ? [] : [term]));
  const [one, other] = names;
  if (one === undefined) return { estimates: [], jointTest: [] };
  const [first, second] = [typedName(one), typedName(other ?? one)];
  return {
    estimates: [
      ...(other === undefined ? [] : [{ words: `${one} and ${other} together`, typed: `${first} + ${second}` }]),
      { words: `${one} held against 1`, typed: `${first} = 1` },
      { words: `${one} above 0, one-sided`, typed: `${first} > 0` },
      ...turningPoint(names),
      ...longRun(names, outcome),
    ],
    jointTest:
      other === undefined
        ? [{ words: `that ${one} is 1`, typed: `${first} = 1` }]
        : [
            { words: `that neither ${one} nor ${other} matters`, typed: `${first} = 0, ${second} = 0` },
            { words: "that both matter alike", typed: `${first} = ${second}` },
          ],
  };
}

export type Examples = Readonly<Record<keyof Asked, readonly Example[]>>;

/** Of a driver that enters with its square: where the curve -b / (2 c) turns. */
function turningPoint(names: readonly string[]): Example[] {
  const square = (name: string): string => `square of ${name}`;
  const curved = names.find((name) => names.includes(square(name)));
  if (curved === undefined) return [];
  const typed = `-${typedName(curved)} / (2 * ${typedName(square(curved))})`;
  return [{ words: `where the curve of ${curved} turns`, typed }];
}

/** Where the outcome's own past enters: what a driver comes to in the long run, b / (1 - rho). */
function longRun(names: readonly string[], outcome: string): Example[] {
  const isPast = (name: string): boolean => name.startsWith(`${outcome} `) && name.endsWith(" earlier");
  const [past, driver] = [names.find(isPast), names.find((name) => !isPast(name))];
  if (past === undefined || driver === undefined) return [];
  return [{ words: `${driver} in the long run`, typed: `${typedName(driver)} / (1 - ${typedName(past)})` }];
}

/** A comma would part the name: it then stands in double quotes. */
const typedName = (name: string): string => (name.includes(",") ? `"${name}"` : name);
