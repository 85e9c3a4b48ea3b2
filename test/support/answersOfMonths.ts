import { analyse } from "../../src/core/answer/analyse.ts";
import type { Answer } from "../../src/core/answer/answer.ts";
import { defaultOptions } from "../../src/core/answer/options.ts";
import type { Model } from "../../src/core/design/model.ts";
import type { Source } from "../../src/core/table/source.ts";
import { toCellColumn } from "./cellColumns.ts";

const plain = { kind: "none" } as const;

/** Forty-eight invented months. */
export const fixtureRows = Array.from({ length: 48 }, (_, row) => {
  const price = 10 + ((row * 7) % 13) / 2;
  const rain = (row * 11) % 17;
  const stray = (((row * 29) % 31) - 15) / 4 + 3 * Math.sin(row / 3);
  return { repairs: 120 - 2.25 * price + 0.375 * rain + stray, price, rain };
});

const source: Source = {
  rowCount: fixtureRows.length,
  columns: [
    ["Repairs", fixtureRows.map(({ repairs }) => repairs)] as const,
    ["Price", fixtureRows.map(({ price }) => price)] as const,
    ["Rain", fixtureRows.map(({ rain }) => rain)] as const,
  ].map(([name, values], column) => ({
    name,
    place: { kind: "argument", argument: "data", column, firstRow: 1 },
    cells: toCellColumn(values),
  })),
};

const model = (rows: Model["rows"]): Model => ({
  outcome: { column: "Repairs", transform: plain },
  drivers: ["Price", "Rain"].map((column) => ({ column, as: "number", base: null, transform: plain })),
  calendar: [],
  rows,
  constant: true,
  textNumbers: [],
});

/** The months as steps through time, with nothing asked yet. */
export const monthsQuestion = { source, model: model({ kind: "time", order: null }) };

function answerOver(rows: Model["rows"]): Answer {
  const answer = analyse({ source, model: model(rows), options: defaultOptions }, () => undefined);
  if (!answer.ok) throw new Error(answer.problem.code);
  return answer.value;
}

/** The answers over the same numbers as steps through time and as separate cases. */
export const answerThroughTime = answerOver({ kind: "time", order: null });
export const answerOverCases = answerOver({ kind: "cases" });
