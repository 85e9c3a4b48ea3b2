import { describe, expect, it } from "vitest";
import { analyse } from "../../../src/core/answer/analyse.ts";
import type { Answer } from "../../../src/core/answer/answer.ts";
import { inquire } from "../../../src/core/answer/inquire.ts";
import { type Parts, modelOf } from "../../../src/core/answer/modelOf.ts";
import { readSettings, settingPairs } from "../../../src/core/answer/settings.ts";
import { answerTable } from "../../../src/core/answer/tables.ts";
import { chow } from "../../../src/core/diagnostics/chow.ts";
import { buildDesign } from "../../../src/core/design/buildDesign.ts";
import { fitLeastSquares } from "../../../src/core/fit/fitLeastSquares.ts";
import type { Question } from "../../../src/core/answer/question.ts";
import type { Result } from "../../../src/core/problem/result.ts";
import type { Cell } from "../../../src/core/table/cells.ts";
import { directErrors, expectAllDigits, statsmodelsErrors } from "../../support/referenceErrors.ts";
import { reference } from "../../support/referenceFit.ts";
import { toCellColumn } from "../../support/cellColumns.ts";

/** What settings alone make of columns, as the worksheet functions and the terminal ask it. */
function questionOf(columns: Readonly<Record<string, readonly Cell[]>>, settings: string, parts: Parts): Question {
  const pairs = must(settingPairs(settings));
  const read = must(readSettings(pairs));
  return {
    source: {
      rowCount: Object.values(columns)[0]!.length,
      columns: Object.entries(columns).map(([name, cells], column) => ({
        name,
        place: { kind: "argument", argument: "data", column, firstRow: 1 },
        cells: toCellColumn(cells),
      })),
    },
    model: must(modelOf(read, parts)),
    options: read.options,
  };
}

function must<T>(result: Result<T>): T {
  if (!result.ok) throw new Error(JSON.stringify(result.problem));
  return result.value;
}

const answerTo = (question: Question): Answer => must(analyse(question, () => undefined));

const n = 48;
const count = (value: (i: number) => number): number[] => Array.from({ length: n }, (_, i) => value(i));
const months = {
  Repairs: count((i) => 20 + ((i * 29) % 19) / 3 - ((i * 7) % 11) / 2),
  Price: count((i) => ((i * 7) % 11) + 2),
  Month: count((i) => 2020 + i),
};
const parts: Parts = { outcome: "Repairs", drivers: ["Price"], key: null, keyIs: "time", order: null };
const inTime: Parts = { ...parts, key: "Month" };

describe("what settings reach", () => {
  it("errors grouped in two ways, as the definition has them", () => {
    const { y, X, drivers, group } = reference("grunfeld");
    const columns = {
      Outcome: y,
      ...Object.fromEntries(drivers.map((name, j) => [name, X[j]!])),
      Firm: group!.map(String),
      Year: y.map((_, i) => `Year ${i % 20}`),
    };
    const asked: Parts = { outcome: "Outcome", drivers, key: "Firm", keyIs: "groups", order: null };
    const answer = answerTo(questionOf(columns, "second groups: Year", asked));
    expectAllDigits(answer.inference.inForce.standardErrors, directErrors["grunfeld"]!.groups!["two-way CR1"], 10);
    expect(answer.rows).toEqual({ kind: "groups", by: "Firm", groups: 11, second: { by: "Year", groups: 20 } });
    expect(answer.verdict[0]).toContain("in 11 groups by Firm and 20 groups by Year");
    expect(answer.decision.because).toBe(
      "rows of one Firm or of one Year may share what the drivers leave unexplained",
    );
    expect(answer.decision.inForce.reference).toEqual({ law: "t", degreesOfFreedom: 10 });
    expect(answer.guards.found.find(({ guard }) => guard === "groups")?.sentences).toEqual([
      "There are only 11 groups by Firm: standard errors by group are then often too small.",
      "There are only 20 groups by Year: standard errors by group are then often too small.",
    ]);
  });

  it("Newey-West within groups, fixed by hand, with no lag from one group into the next", () => {
    const { y, X, drivers, group } = reference("grunfeld");
    const columns = {
      Outcome: y,
      ...Object.fromEntries(drivers.map((name, j) => [name, X[j]!])),
      Firm: group!.map(String),
      Year: y.map((_, i) => 1935 + (i % 20)),
    };
    const { lags, unadjusted } = statsmodelsErrors["grunfeld"]!["newey-west in groups"]!;
    const asked: Parts = { outcome: "Outcome", drivers, key: "Firm", keyIs: "groups", order: "Year" };
    const settings = `errors: newey-west; lags: ${lags}; small-sample factor: no`;
    const answer = answerTo(questionOf(columns, settings, asked));
    expectAllDigits(answer.inference.inForce.standardErrors, unadjusted, 10);
    expect(answer.standardErrors.neweyWest?.lags).toBe(lags);
    expect(answer.decision.called.errors.kind).toBe("grouped");
    expect(answerTable(answer)[0]![4]).toBe("grouped");
    expect(answerTable(answer)[2]!.slice(4, 6)).toEqual([
      answer.standardErrors.grouped!.CR1[1],
      answer.inference.neweyWest!.standardErrors[1],
    ]);
    expect(answerTo(questionOf(columns, "", asked)).standardErrors.neweyWest).toBeNull();
    const timeless = analyse(questionOf(columns, settings, { ...asked, order: null }), () => undefined);
    expect(timeless).toMatchObject({ problem: { code: "errors-need-order", errors: "newey-west", rows: "groups" } });
  });

  it("a curve: a column and its square, with its turning point, and predictions along it", () => {
    const settings = "add: square of Price; estimates: -Price / (2 * square of Price)";
    const question = questionOf(months, settings, parts);
    const answer = answerTo(question);
    expect(answer.terms).toEqual(["constant", "Price", "square of Price"]);
    const [constant = 0, b = 0, c = 0] = answer.coefficients;
    expect(answer.estimates[0]?.estimate?.value).toBeCloseTo(-b / (2 * c), 10);
    const rows = { rowCount: 1, columns: [{ ...question.source.columns[1]!, cells: toCellColumn([5]) }] };
    const prediction = { reference: { law: "normal" }, level: 0.05, spread: "even" } as const;
    const inquiry = { kind: "predictions", errors: { kind: "classical" }, settings: prediction, rows } as const;
    const found = must(inquire(question, inquiry));
    if (found.kind !== "predictions") throw new Error(found.kind);
    expect(found.rows[0]!.value).toBeCloseTo(constant + 5 * b + 25 * c, 10);
    expect(found.rows[0]!.single!.high).toBeGreaterThan(found.rows[0]!.high);
  });

  it("a long-run effect: the outcome's earlier value among the drivers", () => {
    const settings = 'add: lag of Repairs; estimates: Price / (1 - "Repairs 1 year earlier")';
    const answer = answerTo(questionOf(months, settings, inTime));
    expect(answer.terms).toEqual(["constant", "Price", "Repairs 1 year earlier"]);
    expect(answer.observations).toBe(n - 1);
    const [, b = 0, rho = 0] = answer.coefficients;
    expect(answer.estimates[0]?.estimate?.value).toBeCloseTo(b / (1 - rho), 12);
  });

  it("dates as drivers, in their own units", () => {
    const opened = count((i) => 40000 + ((i * 37) % 500)).map((date) => ({ date }));
    const question = questionOf({ ...months, Opened: opened }, "dates: Opened", {
      ...parts,
      drivers: ["Price", "Opened"],
    });
    const answer = answerTo(question);
    expect(answer.drivers[2]!.sentence).toMatch(/^Each further day goes with|^Opened: no effect/);
    expect(answer.notes.join(" ")).toContain("Opened counts days since");
  });

  it("a break at the row that is named, and at half of them where none is", () => {
    const question = questionOf(months, "break after: 13", inTime);
    const fit = must(fitLeastSquares(must(buildDesign(question.source, question.model))));
    const chowOf = (settings: string) =>
      answerTo(questionOf(months, settings, inTime)).tests.find(({ test }) => test === "chow");
    expect(chowOf("break after: 13")).toEqual(chow(fit, 13));
    expect(chowOf("")).toEqual(chow(fit, 24));
    expect(chowOf("break after: 13")).not.toEqual(chowOf(""));
    expect(chowOf(`break after: ${n}`)).toMatchObject({
      kind: "not-applicable",
      because: "there are only 48 rows, so none comes after row 48",
    });
  });
});
