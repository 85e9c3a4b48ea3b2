import { describe, expect, it } from "vitest";
import { analyse } from "../../../src/core/answer/analyse.ts";
import { defaultOptions } from "../../../src/core/answer/options.ts";
import type { Question } from "../../../src/core/answer/question.ts";
import type { Answer } from "../../../src/core/answer/answer.ts";
import type { Model } from "../../../src/core/design/model.ts";
import { toCellColumn } from "../../support/cellColumns.ts";

const none = { kind: "none" } as const;

function ask(columns: Readonly<Record<string, readonly number[]>>, model: Partial<Model> = {}): Question {
  const [outcome = "", ...drivers] = Object.keys(columns);
  return {
    source: {
      rowCount: columns[outcome]!.length,
      columns: Object.entries(columns).map(([name, values], column) => ({
        name,
        place: { kind: "sheet", sheet: "Data", column, firstRow: 1 },
        cells: toCellColumn(values),
      })),
    },
    model: {
      outcome: { column: outcome, transform: none },
      drivers: drivers.map((column) => ({ column, as: "number", base: null, transform: none })),
      calendar: [],
      rows: { kind: "cases" },
      constant: true,
      textNumbers: [],
      ...model,
    },
    options: defaultOptions,
  };
}

const found = (question: Question) => analyse(question, () => undefined);

const problemOf = (question: Question): unknown => {
  const result = found(question);
  return result.ok ? "no problem" : result.problem;
};

/** No figure anywhere in an answer may be NaN or infinite. */
function unfit(value: unknown, path = "answer"): string[] {
  if (typeof value === "number") return Number.isFinite(value) ? [] : [path];
  if (value === null || typeof value !== "object") return [];
  return Object.entries(value).flatMap(([name, part]) => unfit(part, `${path}.${name}`));
}

const answerOf = (question: Question): Answer => {
  const result = found(question);
  if (!result.ok) throw new Error(JSON.stringify(result.problem));
  return result.value;
};

const wave = (count: number, step: number): number[] =>
  Array.from({ length: count }, (_, row) => Math.sin(row * step) * 3 + row * 0.11);

describe("designs at the edge", () => {
  it("a row with a dummy of its own: the White version falls back in the open, every figure is finite", () => {
    const dummy = Array.from({ length: 14 }, (_, row) => (row === 5 ? 1 : 0));
    const answer = answerOf(ask({ Sales: wave(14, 1.9), Price: wave(14, 0.7), Strike: dummy }));
    expect(answer.standardErrors.whiteFallback).toMatch(/row/i);
    expect(unfit(answer)).toEqual([]);
  });

  it("a coefficient that one row alone determines without a constant: no standard error of zero is acted on", () => {
    const dummy = Array.from({ length: 14 }, (_, row) => (row === 5 ? 1 : 0));
    const price = wave(14, 0.7).map((value, row) => (row === 5 ? 0 : value));
    expect(problemOf(ask({ Sales: wave(14, 1.9), Price: price, Strike: dummy }, { constant: false }))).toEqual({
      code: "zero-standard-error",
      errors: "white",
      term: "Strike",
    });
  });

  it("a variance that rounds below zero is no figure to act on", () => {
    const columns = { Sales: [1000, 0, 0, 0], Price: [0, 0, 0.1631, 0], Fuel: [1000, 0, 0, 1000] };
    expect(problemOf(ask(columns))).toMatchObject({ code: "zero-standard-error" });
  });

  it("one row more than coefficients still answers, and says how little it is", () => {
    const answer = answerOf(ask({ Sales: [3, 5, 4, 8], Price: [1, 2, 4, 3], Fuel: [2, 1, 5, 4] }));
    expect(answer.fit.degreesOfFreedom).toBe(1);
    expect(unfit(answer)).toEqual([]);
  });

  it.each([
    ["too few rows", { Sales: [3, 5], Price: [1, 2] }, "too-few-rows"],
    ["an outcome that never varies", { Sales: [4, 4, 4, 4, 4], Price: [1, 2, 4, 3, 7] }, "constant-outcome"],
    ["a driver that never varies", { Sales: [3, 5, 4, 8, 6], Price: [2, 2, 2, 2, 2] }, "constant-column"],
    ["a perfect fit", { Sales: [3, 5, 9, 7, 15], Price: [1, 2, 4, 3, 7] }, "perfect-fit"],
    [
      "a column made of others",
      { Sales: [3, 5, 4, 8, 6, 1], Price: [1, 2, 4, 3, 7, 2], Twice: [2, 4, 8, 6, 14, 4] },
      "dependent-columns",
    ],
  ])("%s is refused with its name", (_, columns, code) => {
    expect(problemOf(ask(columns))).toMatchObject({ code });
  });
});
