import { describe, expect, it } from "vitest";
import { functionTable } from "../../src/functions/functionTable.ts";
import { registerFunctions } from "../../src/functions/register.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import { type Shown, call, functionsRuntime } from "../support/functionsRuntime.ts";

/** One of each kind of thing that a cell hands over. */
const kinds: Readonly<Record<string, unknown>> = {
  blank: null,
  nothing: undefined,
  "empty text": "",
  "a space": " ",
  zero: 0,
  "minus zero": -0,
  true: true,
  false: false,
  "a huge number": 1e308,
  "a tiny number": 5e-324,
  "no number": NaN,
  infinity: -Infinity,
  "a date's serial": 45_000,
  text: "North",
  "a mark for missing": "n/a",
  "a number as text": "1,234.5",
  "a date as text": "2024-01",
  "a text like an error": "#DIV/0!",
  "a text like a formula": "=1",
  "a long text": "x".repeat(40_000),
  "an error": { code: "#N/A", type: "CustomFunctionError" },
  "a formatted number": { type: "FormattedNumber", basicValue: 3.5, numberFormat: "0.0" },
  "a rich error": { type: "Error", basicValue: "#NUM!" },
  "an entity": { type: "Entity", text: "Oslo", basicValue: "#VALUE!" },
  "an object of no kind": {},
};

const height = 14;
const sound: Readonly<Record<string, unknown>> = {
  outcome: [["y"], ...Array.from({ length: height }, (_, row) => [row * 2 + ((row * 5) % 7)])],
  drivers: [["a", "b"], ...Array.from({ length: height }, (_, row) => [row, (row * 3) % 5])],
  key: null,
  settings: null,
  weights: [[1, -1]],
  rows: [
    [3, 2],
    [4, 1],
  ],
};

type Place = "heading" | "middle" | "last";
const places: readonly Place[] = ["heading", "middle", "last"];

/** The cells of a sound argument with one of them replaced; a key and settings are made up, so that they are there at all. */
function withOne(name: string, odd: unknown, place: Place): unknown {
  const madeUp: Readonly<Record<string, unknown[][]>> = {
    key: [["t"], ...Array.from({ length: height }, (_, row) => [row + 1])],
    settings: [
      ["policy", "textbook"],
      ["level", 0.1],
    ],
    against: [[0], [1], [2]],
    equals: [[0]],
  };
  const cells = (sound[name] ?? madeUp[name]) as unknown[][];
  const row = { heading: 0, middle: Math.floor(cells.length / 2), last: cells.length - 1 }[place];
  return cells.with(row, cells[row]!.with(-1, odd));
}

const keepsRules = (shown: Shown): boolean => {
  if (typeof shown === "number") return Number.isFinite(shown) && !Object.is(shown, -0);
  if (typeof shown === "string") return shown.length <= 32_767 && !/^\s*#(N\/A|[A-Z0-9/]+[!?])\s*$/i.test(shown);
  return typeof shown === "object" && shown.error.startsWith("#");
};

const runtime = functionsRuntime();
registerFunctions(runtime.runtime, inlineAnalyst);

/** Whether the call gave a result that keeps the rules; an error must have its sentence and be no fault of ours. */
async function answers(id: string, values: readonly unknown[]): Promise<boolean> {
  const reply = await call(runtime, id, ...values);
  if (!Array.isArray(reply)) {
    expect(["#VALUE!", "#N/A"]).toContain(reply.error);
    expect(reply.message.length).toBeGreaterThan(15);
    expect(reply.message).not.toContain("fault of its own");
    return false;
  }
  expect(new Set(reply.map(({ length }) => length)).size).toBe(1);
  expect(reply.flat().filter((shown) => !keepsRules(shown))).toEqual([]);
  return true;
}

const positions = functionTable.flatMap(({ id, parameters }) =>
  parameters.map(({ name, shape }, at) => ({ id, parameters, name, shape, at })),
);

describe("every kind of cell in every position", () => {
  it.each(positions)("$id, $name: a result that keeps the rules, or an error with a sentence", async (position) => {
    const { id, parameters, name, shape, at } = position;
    const usual: unknown[] = parameters.map((parameter) =>
      id === "LAGS" && parameter.name === "rows" ? 96 : (sound[parameter.name] ?? null),
    );
    expect(await answers(id, usual)).toBe(true);
    let answered = 0;
    for (const odd of Object.values(kinds)) {
      const inPlace = shape === "cells" ? places.map((place) => withOne(name, odd, place)) : [];
      for (const argument of [odd, [[odd]], ...inPlace]) {
        if (await answers(id, usual.with(at, argument))) answered += 1;
      }
    }
    // What is left out is always taken, whatever the position, unless it must be there.
    expect(answered).toBeGreaterThanOrEqual(parameters[at]!.optional ? 2 : 0);
  });
});
