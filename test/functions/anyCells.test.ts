import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { functionTable } from "../../src/functions/functionTable.ts";
import { registerFunctions } from "../../src/functions/register.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import { ErrorCode, type Shown, call, functionsRuntime } from "../support/functionsRuntime.ts";

const signs = Object.values(ErrorCode);

/** Every kind of thing that a cell can hand over, and some that only a caller within the page could. */
const oddCell: fc.Arbitrary<unknown> = fc.oneof(
  fc.constantFrom<unknown>(null, undefined, "", " ", 0, -0, true, false),
  fc.constantFrom<unknown>(1e308, -1e308, 5e-324, NaN, Infinity, -Infinity, 2 ** 53, 45_000),
  fc.constantFrom<unknown>(
    "NA",
    "n/a",
    "-",
    "#N/A",
    "#DIV/0!",
    "1,234.5",
    "12 %",
    "(7)",
    "2024-01",
    "Jan 2020",
    "=1",
    "North",
  ),
  fc.constantFrom(...signs).map((code) => ({ code, type: "CustomFunctionError" })),
  fc.constantFrom<unknown>(
    { type: "FormattedNumber", basicValue: 3.5, numberFormat: "0.0" },
    { type: "Error", basicValue: "#NUM!" },
    { type: "Entity", text: "Oslo", basicValue: "#VALUE!" },
    {},
  ),
  fc.string({ maxLength: 12 }),
  fc.double(),
);

const plainNumber = fc.integer({ min: -9999, max: 9999 }).map((number) => number / 8);
const cell = fc.oneof({ weight: 60, arbitrary: plainNumber }, { weight: 1, arbitrary: oddCell });
const heading = fc.oneof(
  { weight: 9, arbitrary: fc.string({ minLength: 1, maxLength: 8 }) },
  { weight: 1, arbitrary: oddCell },
);

const tables = fc
  .record({ rows: fc.integer({ min: 0, max: 18 }), columns: fc.integer({ min: 1, max: 4 }), headed: fc.boolean() })
  .chain(({ rows, columns, headed }) =>
    fc.record({
      headings: fc.array(heading, { minLength: columns, maxLength: columns }),
      headed: fc.constant(headed),
      body: fc.array(fc.array(cell, { minLength: columns, maxLength: columns }), { minLength: rows, maxLength: rows }),
    }),
  )
  .map(({ headings, headed, body }) => (headed ? [headings, ...body] : body));

const option = fc.oneof(
  { weight: 3, arbitrary: fc.constant(null) },
  {
    weight: 3,
    arbitrary: fc.constantFrom<unknown>(
      "white",
      "classical",
      "newey-west",
      "grouped",
      "koenker",
      "breusch-godfrey",
      1,
      "careful",
    ),
  },
  { weight: 1, arbitrary: oddCell },
);

const settings = fc.oneof(
  { weight: 4, arbitrary: fc.constant<unknown>(null) },
  {
    weight: 4,
    arbitrary: fc.constantFrom<unknown>(
      "rows: time; lags: 2",
      [["policy", "textbook"]],
      "policy: always-robust",
      "text numbers: point",
      "constant: no",
    ),
  },
  { weight: 1, arbitrary: fc.array(fc.array(oddCell, { minLength: 2, maxLength: 2 }), { maxLength: 3 }) },
  { weight: 1, arbitrary: oddCell },
);

const calls = fc.record({
  spec: fc.constantFrom(...functionTable),
  table: tables,
  key: fc.boolean(),
  options: fc.array(option, { minLength: 3, maxLength: 3 }),
  settings,
});

const isRule = (shown: Shown): boolean =>
  typeof shown === "number"
    ? Number.isFinite(shown) && !Object.is(shown, -0)
    : typeof shown === "string"
      ? !/^\s*#(N\/A|[A-Z0-9/]+[!?])\s*$/i.test(shown)
      : typeof shown === "object" && shown.error.startsWith("#");

describe("any cells at all", () => {
  const runtime = functionsRuntime();
  registerFunctions(runtime.runtime, inlineAnalyst);

  it("bring a result that keeps the rules, or an error with a sentence, and never a fault of ours", async () => {
    let answered = 0;
    let refused = 0;
    await fc.assert(
      fc.asyncProperty(calls, async ({ spec, table, key, options, settings: chosen }) => {
        const data: Record<string, unknown> = {
          outcome: table.map((row) => [row[0]]),
          drivers: table.map((row) => row.slice(1)),
          key: key ? table.map((_, index) => [index]) : null,
          settings: chosen,
          rows: table.slice(0, 4).map((row) => row.slice(1)),
          weights: [(table[0] ?? []).slice(1).map((_, index) => index + 1)],
        };
        const values = spec.parameters.map(({ name }, index) => (name in data ? data[name] : options[index % 3]));
        const reply = await call(runtime, spec.id, ...values);
        if (!Array.isArray(reply)) {
          refused++;
          expect(["#VALUE!", "#N/A"]).toContain(reply.error);
          expect(reply.message.length).toBeGreaterThan(15);
          expect(reply.message).not.toContain("fault of its own");
          return;
        }
        answered++;
        expect(new Set(reply.map(({ length }) => length)).size).toBe(1);
        for (const shown of reply.flat()) expect({ shown, isRule: isRule(shown) }).toEqual({ shown, isRule: true });
      }),
      { seed: 20261204, numRuns: 3000 },
    );
    expect(answered).toBeGreaterThan(500);
    expect(refused).toBeGreaterThan(500);
  }, 240_000);

  it("shows no number where a null, a NaN or an infinity would have become a zero", async () => {
    const y = Array.from({ length: 12 }, (_, row) => [row * row + ((row * 5) % 7)]);
    const x = Array.from({ length: 12 }, (_, row) => [row, (row * 3) % 5]);
    const table = (await call(runtime, "ANSWER", y, x, null, null)) as Shown[][];
    expect(table.flat().filter((shown) => shown === 0)).toEqual([]);
  });
});
