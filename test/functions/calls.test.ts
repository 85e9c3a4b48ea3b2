import { describe, expect, it, vi } from "vitest";
import type { Analyst } from "../../src/app/analyst.ts";
import type { Answer } from "../../src/core/answer/answer.ts";
import { choiceText } from "../../src/core/answer/tables.ts";
import { notApplicable } from "../../src/core/diagnostics/outcome.ts";
import { pValueOf } from "../../src/core/inference/ratioLaw.ts";
import type { Question } from "../../src/core/answer/question.ts";
import { settingTable } from "../../src/core/answer/settingTable.ts";
import { type Result, failure, success } from "../../src/core/problem/result.ts";
import { registerFunctions } from "../../src/functions/register.ts";
import { answerOverCases, answerThroughTime } from "../support/answersOfMonths.ts";
import { type Runtime, call, functionsRuntime } from "../support/functionsRuntime.ts";

const outcome = [["Repairs"], [5], [7], [6]];
const drivers = [
  ["Price", "Rain"],
  [1, 2],
  [3, 4],
  [5, 7],
];

interface Desk extends Runtime {
  readonly asked: Question[];
}

function deskWith(analyse: Analyst["analyse"]): Desk {
  const asked: Question[] = [];
  const runtime = functionsRuntime();
  registerFunctions(runtime.runtime, {
    analyse: (question, errand) => {
      asked.push(question);
      return analyse(question, errand);
    },
    inquire: () => Promise.reject(new Error("not asked for")),
  });
  return { ...runtime, asked };
}

const answering = (answer: Answer = answerThroughTime) => deskWith(() => Promise.resolve(success(answer)));
const { inference, coefficients } = answerThroughTime;
const column = (values: readonly (number | string)[]) => values.map((value) => [value]);

describe("what each function shows of an answer", () => {
  const desk = answering();
  const ask = (id: string, ...more: unknown[]) => call(desk, id, outcome, drivers, ...more);

  it("ANSWER: a row a driver under its headings, blank where a kind does not apply", async () => {
    const [headings, ...table] = (await ask("ANSWER", null, null)) as unknown[][];
    expect(headings?.slice(0, 10)).toEqual([
      "driver",
      "coefficient",
      "classical",
      "White",
      "Newey-West",
      "in force",
      "ratio",
      "p-value",
      "low",
      "high",
    ]);
    const { classical, white, neweyWest, inForce } = inference;
    const expected = ["constant", "Price", "Rain"].map((name, row) => [
      name,
      coefficients[row],
      classical.standardErrors[row],
      white.standardErrors[row],
      neweyWest?.standardErrors[row],
      inForce.standardErrors[row],
      inForce.ratio[row],
      inForce.pValue[row],
      inForce.low[row],
      inForce.high[row],
    ]);
    expect(table.map((row) => row.slice(0, 10))).toEqual(expected);
    const cases = (await call(answering(answerOverCases), "ANSWER", outcome, drivers, null, null)) as unknown[][];
    expect(cases.slice(1).map((row) => row[4])).toEqual(["", "", ""]);
  });

  it("COEFFICIENTS, ERRORS, PVALUES and INTERVALS: columns in the order of the terms", async () => {
    expect(await ask("COEFFICIENTS", null, null)).toEqual(column(coefficients));
    expect(await ask("ERRORS", null, null, null)).toEqual(column(inference.inForce.standardErrors));
    expect(await ask("ERRORS", "White", null, null)).toEqual(column(inference.white.standardErrors));
    expect(await ask("ERRORS", "newey west", null, null)).toEqual(column(inference.neweyWest!.standardErrors));
    expect(await ask("PVALUES", "classical", null, null, null)).toEqual(column(inference.classical.pValue));
    expect(await ask("INTERVALS", "by tests", null, null)).toEqual(
      inference.inForce.low.map((low, row) => [low, inference.inForce.high[row]]),
    );
  });

  it("PVALUES against given values: one for all, or one a coefficient", async () => {
    const own = coefficients.map((coefficient) => [coefficient]);
    expect(await ask("PVALUES", "classical", own, null, null)).toEqual([[1], [1], [1]]);
    expect(await ask("PVALUES", "classical", [[0]], null, null)).toEqual(column(inference.classical.pValue));
    const one = (await ask("PVALUES", "classical", 0.25, null, null)) as number[][];
    const ratio = (coefficients[2]! - 0.25) / inference.classical.standardErrors[2]!;
    expect(one[2]![0]).toBeCloseTo(pValueOf(ratio, { law: "t", degreesOfFreedom: 45 }), 12);
    expect(await ask("PVALUES", null, [[1], [2]], null, null)).toMatchObject({ error: "#VALUE!" });
    expect(await ask("PVALUES", null, [["one"]], null, null)).toMatchObject({ error: "#VALUE!" });
  });

  it("VERDICT: a sentence a row, or the one about a driver by name or number", async () => {
    expect(await ask("VERDICT", null, null, null)).toEqual(column(answerThroughTime.verdict));
    const [, price, rain] = answerThroughTime.drivers;
    expect(await ask("VERDICT", "rain", null, null)).toEqual([[rain?.sentence]]);
    expect(await ask("VERDICT", 1, null, null)).toEqual([[price?.sentence]]);
    expect(await ask("VERDICT", "Pirce", null, null)).toMatchObject({
      error: "#VALUE!",
      message: expect.stringContaining("Price") as string,
    });
  });

  it("EVIDENCE: all tests, or the figures of one, a row an order", async () => {
    const { tests } = answerThroughTime;
    const figures = (name: string) =>
      tests.flatMap((outcome) => {
        if (outcome.test !== name || outcome.kind !== "computed") return [];
        const { statistic, df, pValue } = outcome.figure;
        return [[statistic, df.length === 1 ? df[0] : df.join(", "), pValue]];
      });
    const table = (await ask("EVIDENCE", null, null, null)) as unknown[][];
    expect(table[0]).toContain("p-value");
    expect(table.flat()).toContain(figures("koenker")[0]?.[0]);
    expect(await ask("EVIDENCE", "koenker", null, null)).toEqual(figures("koenker"));
    expect(figures("breusch-godfrey").length).toBeGreaterThan(1);
    expect(await ask("EVIDENCE", "Breusch Godfrey", null, null)).toEqual(figures("breusch-godfrey"));
    const because = "too few rows for its columns";
    const without = answering({ ...answerThroughTime, tests: [notApplicable("white", because)] });
    expect(await call(without, "EVIDENCE", outcome, drivers, "white", null, null)).toEqual({
      error: "#N/A",
      message: `The test does not apply: ${because}`,
    });
    expect(await ask("EVIDENCE", "koenkr", null, null)).toMatchObject({
      error: "#VALUE!",
      message: expect.stringContaining("koenker") as string,
    });
  });

  it("CHOICE: one text", async () => {
    expect(await ask("CHOICE", null, null)).toEqual([[choiceText(answerThroughTime)]]);
  });

  it("a kind that is unknown or does not fit the rows: an error with its sentence", async () => {
    expect(await ask("ERRORS", "robust", null, null)).toMatchObject({ error: "#VALUE!" });
    const fault = await ask("ERRORS", "grouped", null, null);
    expect(fault).toMatchObject({ error: "#N/A" });
    expect((fault as { message: string }).message.length).toBeGreaterThan(20);
  });

  it("LAGS: what a rule gives for a number of rows", async () => {
    // Careful: ceil(1.3 sqrt 100) - 1; thumb: floor(4 (250/100)^(2/9)); cube root: floor(0.75 * 6).
    expect(await call(desk, "LAGS", 100, null)).toEqual([[12]]);
    expect(await call(desk, "LAGS", 250, "thumb")).toEqual([[4]]);
    expect(await call(desk, "LAGS", 216, "Cube-root")).toEqual([[4]]);
    expect(await call(desk, "LAGS", 2.5, null)).toMatchObject({ error: "#VALUE!" });
    expect(await call(desk, "LAGS", 100, "thum")).toMatchObject({
      error: "#VALUE!",
      message: expect.stringContaining("thumb") as string,
    });
  });

  it("SETTINGS: the manual inside the sheet, without any data", async () => {
    const table = (await call(desk, "SETTINGS")) as unknown[][];
    expect(table).toHaveLength(settingTable.length + 1);
    expect(table.map(([name]) => name)).toContain("white version");
  });
});

describe("settings of a call", () => {
  const settingsOf = async (settings: unknown, key: unknown = null) => {
    const desk = answering();
    const reply = await call(desk, "ANSWER", outcome, drivers, settings, key);
    return { reply, question: desk.asked[0] };
  };

  it("come as a text or as two columns, under a heading or not", async () => {
    const texts = [
      [["lags: 4; policy: textbook"]],
      "lags: 4; policy: textbook",
      [
        ["lags", 4],
        ["policy", "textbook"],
      ],
      [
        ["Setting", "Value"],
        ["lags", 4],
        [null, null],
        ["level", null],
        ["policy", "textbook"],
      ],
    ];
    for (const text of texts) {
      const { question } = await settingsOf(text);
      expect(question?.options.policy).toBe("textbook");
      expect(question?.options.lags).toEqual({ kind: "given", lags: 4 });
    }
  });

  it("say what the key is, where the key does not say it itself", async () => {
    const key = [["Month"], [1], [2], [3]];
    expect((await settingsOf(null, key)).question?.model.rows).toEqual({ kind: "time", order: "Month" });
    const groups = [["Town"], ["a"], ["a"], ["b"]];
    expect((await settingsOf(null, groups)).question?.model.rows).toMatchObject({ kind: "groups", by: "Town" });
    expect((await settingsOf("rows: cases", key)).question?.model.rows).toEqual({ kind: "cases" });
    expect((await settingsOf("rows: time")).question?.model.rows).toEqual({ kind: "time", order: null });
  });

  it("that are unknown are answered with the nearest known one", async () => {
    const { reply, question } = await settingsOf("lag rule: 4");
    expect(reply).toMatchObject({ error: "#VALUE!" });
    expect((await settingsOf("polcy: careful")).reply).toMatchObject({
      message: expect.stringContaining("policy") as string,
    });
    expect(question).toBeUndefined();
  });
});

describe("calls in Excel's hands", () => {
  it("share one analysis of the same cells, however many functions ask, and ask again when a cell changes", async () => {
    const desk = answering();
    await Promise.all([
      call(desk, "ANSWER", outcome, drivers, null, null),
      call(desk, "ERRORS", outcome, drivers, "white", null, null),
      call(desk, "VERDICT", outcome, drivers, null, null, null),
    ]);
    await call(desk, "CHOICE", outcome, drivers, null, null);
    expect(desk.asked).toHaveLength(1);
    await call(desk, "CHOICE", outcome, drivers.with(2, [3, 4.5]), null, null);
    await call(desk, "CHOICE", outcome, drivers, "level: 0.1", null);
    expect(desk.asked).toHaveLength(3);
  });

  it("end with the sentence of a problem", async () => {
    const desk = deskWith(() => Promise.resolve(failure({ code: "too-few-rows", rows: 3, needed: 4, leftOut: 0 })));
    const reply = await call(desk, "ANSWER", outcome, drivers, null, null);
    expect(reply).toMatchObject({ error: "#N/A", message: expect.stringContaining("needs at least 4") as string });
  });

  it("say of a fault of ours that it is one", async () => {
    const desk = deskWith(() => Promise.reject(new Error("index 7 of nothing")));
    expect(await call(desk, "ANSWER", outcome, drivers, null, null)).toEqual({
      error: "#VALUE!",
      message: "Footing has a fault of its own here: index 7 of nothing",
    });
  });

  it("are answered without any work while a formula is previewed", async () => {
    const desk = answering();
    const shown = await desk.functions.get("ANSWER")!(outcome, drivers, null, null, { isInValuePreview: true });
    expect(shown).toEqual([["Shown once the formula is entered"]]);
    expect(desk.asked).toHaveLength(0);
  });

  it("stop the work when the last of them is cancelled", async () => {
    const signals: AbortSignal[] = [];
    const desk = deskWith((_, { signal }) => {
      signals.push(signal);
      return new Promise<Result<Answer>>(() => undefined);
    });
    const invocations = [{}, {}] as { onCanceled?: () => void }[];
    const calls = invocations.map((invocation) =>
      desk.functions.get("ANSWER")!(outcome, drivers, null, null, invocation).catch((fault: unknown) => fault),
    );
    await vi.waitFor(() => expect(signals).toHaveLength(1));
    await new Promise((resolve) => setTimeout(resolve, 5));
    invocations[0]!.onCanceled!();
    expect(await calls[0]).toMatchObject({ code: "#N/A" });
    expect(signals[0]!.aborted).toBe(false);
    invocations[1]!.onCanceled!();
    invocations[1]!.onCanceled!();
    await calls[1];
    expect(signals[0]!.aborted).toBe(true);
  });

  it("end after two minutes at the latest", async () => {
    vi.useFakeTimers();
    try {
      const desk = deskWith(() => new Promise<Result<Answer>>(() => undefined));
      const waiting = call(desk, "ANSWER", outcome, drivers, null, null);
      await vi.advanceTimersByTimeAsync(119_000);
      const early = await Promise.race([waiting, Promise.resolve("still waiting")]);
      expect(early).toBe("still waiting");
      await vi.advanceTimersByTimeAsync(2000);
      expect(await waiting).toMatchObject({ error: "#N/A" });
    } finally {
      vi.useRealTimers();
    }
  });
});

describe("drivers whose rectangle spans the outcome", () => {
  const spanning = [
    ["Price", "Repairs", "Rain"],
    [1, 5, 2],
    [3, 7, 4],
    [5, 6, 7],
  ];

  it("are those that the setting names", async () => {
    const desk = answering();
    await call(desk, "COEFFICIENTS", outcome, spanning, "columns: 1, 3");
    expect(desk.asked[0]?.model.drivers.map(({ column: name }) => name)).toEqual(["Price", "Rain"]);
  });

  it("are refused where nothing leaves the outcome out", async () => {
    const desk = answering();
    expect(await call(desk, "COEFFICIENTS", outcome, spanning)).toMatchObject({
      error: "#VALUE!",
      message: expect.stringContaining('"Repairs" stands above more than one column') as string,
    });
    expect(desk.asked).toEqual([]);
  });
});
