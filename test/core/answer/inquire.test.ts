import { describe, expect, it } from "vitest";
import { analyse } from "../../../src/core/answer/analyse.ts";
import { type Finding, type Inquiry, inquire } from "../../../src/core/answer/inquire.ts";
import { defaultOptions } from "../../../src/core/answer/options.ts";
import type { Model, Transform } from "../../../src/core/design/model.ts";
import type { Result } from "../../../src/core/problem/result.ts";
import type { Cell } from "../../../src/core/table/cells.ts";
import type { Source } from "../../../src/core/table/source.ts";
import { toCellColumn } from "../../support/cellColumns.ts";

const plain: Transform = { kind: "none" };

const sourceOf = (columns: Readonly<Record<string, readonly Cell[]>>): Source => ({
  rowCount: Object.values(columns)[0]?.length ?? 0,
  columns: Object.entries(columns).map(([name, cells], column) => ({
    name,
    place: { kind: "argument", argument: "data", column, firstRow: 1 },
    cells: toCellColumn(cells),
  })),
});

const modelOf = (
  drivers: Readonly<Record<string, Partial<Model["drivers"][number]>>>,
  rows: Model["rows"] = { kind: "cases" },
): Model => ({
  outcome: { column: "y", transform: plain },
  drivers: Object.entries(drivers).map(([column, more]) => ({
    column,
    as: "number",
    base: null,
    transform: plain,
    ...more,
  })),
  calendar: [],
  rows,
  constant: true,
  textNumbers: [],
});

const count = 30;
const a = Array.from({ length: count }, (_, row) => 3 + ((row * 7) % 11) / 2);
const b = Array.from({ length: count }, (_, row) => ((row * 13) % 17) - 5);
const y = Array.from({ length: count }, (_, row) => 4 + 2 * a[row]! - 0.75 * b[row]! + ((row * 29) % 19) / 3);
const month = Array.from({ length: count }, (_, row) => 100 - row);
const town = Array.from({ length: count }, (_, row) => ["North", "South", "West"][(row * 5) % 3]!);
const source = sourceOf({ y: y.with(4, null as never), a, b, month, town });
const model = modelOf({ a: {}, b: {} });

const must = <T>(result: Result<T>): T => {
  if (!result.ok) throw new Error(JSON.stringify(result.problem));
  return result.value;
};

function find<Kind extends Finding["kind"]>(
  inquiry: Inquiry,
  kind: Kind,
  over = model,
): Extract<Finding, { kind: Kind }> {
  const finding = must(inquire({ source, model: over }, inquiry));
  if (finding.kind !== kind) throw new Error(finding.kind);
  return finding as Extract<Finding, { kind: Kind }>;
}

const answer = must(analyse({ source, model, options: defaultOptions }, () => undefined));
const HC3 = { kind: "white", version: "HC3" } as const;
const classical = { kind: "classical" } as const;

describe("what is asked beyond an answer", () => {
  it("residuals and fitted values stand in the rows of the source, whatever the order in time", () => {
    for (const over of [model, modelOf({ a: {}, b: {} }, { kind: "time", order: "month" })]) {
      const { fitted, residuals, used } = find({ kind: "row by row" }, "row by row", over);
      const [constant = 0, slopeA = 0, slopeB = 0] = answer.coefficients;
      expect([...used].flatMap((one, row) => (one === 0 ? [row] : []))).toEqual([4]);
      for (let row = 0; row < count; row++) {
        if (row === 4) continue;
        expect(fitted[row]).toBeCloseTo(constant + slopeA * a[row]! + slopeB * b[row]!, 10);
        expect(fitted[row]! + residuals[row]!).toBeCloseTo(y[row]!, 12);
      }
    }
  });

  it("the covariance is symmetric and its diagonal squares the standard errors", () => {
    const { rows } = find({ kind: "covariance", errors: HC3 }, "covariance");
    expect(rows).toHaveLength(3);
    rows.forEach((row, i) => {
      expect(Math.sqrt(row[i]!)).toBeCloseTo(answer.inference.white.standardErrors[i]!, 12);
      row.forEach((value, j) => expect(value).toBeCloseTo(rows[j]![i]!, 12));
    });
  });

  it("a joint test of one coefficient is its squared ratio, and of none but the constant the answer's own", () => {
    const one = { weights: [[0, 1, 0]], equals: [1.5] };
    const { outcome } = find({ kind: "joint test", errors: HC3, restrictions: one }, "joint test");
    const ratio = (answer.coefficients[1]! - 1.5) / answer.inference.white.standardErrors[1]!;
    expect(outcome).toMatchObject({ kind: "computed", figure: { law: "chi-square", df: [1] } });
    expect(outcome.kind === "computed" && outcome.figure.statistic).toBeCloseTo(ratio ** 2, 9);
    const restrictions = {
      weights: [
        [0, 1, 0],
        [0, 0, 1],
      ],
      equals: [0, 0],
    };
    expect(find({ kind: "joint test", errors: classical, restrictions }, "joint test").outcome).toEqual(
      answer.joint.classical,
    );
  });

  it("a prediction is the constant of the same regression with drivers counted from the new row", () => {
    const rows = sourceOf({ a: [6.5, null, 3], b: [2, 1, 30] });
    const reference = { law: "t", degreesOfFreedom: 26 } as const;
    const settings = { reference, level: 0.05, spread: "even" } as const;
    const predicted = find({ kind: "predictions", errors: HC3, settings, rows }, "predictions").rows;
    expect(predicted[1]).toBeNull();
    const shifted = sourceOf({ y: y.with(4, null as never), a: a.map((x) => x - 6.5), b: b.map((x) => x - 2) });
    const there = must(analyse({ source: shifted, model, options: defaultOptions }, () => undefined));
    expect(predicted[0]?.value).toBeCloseTo(there.coefficients[0]!, 10);
    expect(predicted[0]?.standardError).toBeCloseTo(there.inference.white.standardErrors[0]!, 10);
    expect(predicted[0]).toMatchObject({ beyond: false });
    expect(predicted[2]).toMatchObject({ beyond: true });
  });

  it("predictions take transforms and categories as the fit does: a row of the data gets its own fitted value", () => {
    const over = modelOf({
      a: { transform: { kind: "logarithm" } },
      b: { transform: { kind: "square" } },
      town: { as: "category" },
    });
    const { fitted } = find({ kind: "row by row" }, "row by row", over);
    const settings = { reference: { law: "normal" }, level: 0.05, spread: "uneven" } as const;
    const rows = sourceOf({ town: [town[7]!, town[9]!], b: [b[7]!, b[9]!], a: [a[7]!, a[9]!] });
    const predicted = find({ kind: "predictions", errors: HC3, settings, rows }, "predictions", over).rows;
    expect(predicted[0]?.value).toBeCloseTo(fitted[7]!, 10);
    expect(predicted[1]?.value).toBeCloseTo(fitted[9]!, 10);
    expect(predicted[0]?.single).toBeNull();
  });

  it("says what new rows lack", () => {
    const ask = (rows: Source, over = model) => {
      const settings = { reference: { law: "normal" }, level: 0.05, spread: "even" } as const;
      return inquire({ source, model: over }, { kind: "predictions", errors: classical, settings, rows });
    };
    expect(ask(sourceOf({ a: [1] }))).toMatchObject({ problem: { code: "unknown-heading", heading: "b" } });
    expect(ask(sourceOf({ a: [1], b: ["x"] }))).toMatchObject({ ok: false });
    const towns = modelOf({ town: { as: "category" } });
    expect(ask(sourceOf({ town: ["East"] }), towns)).toMatchObject({
      problem: { code: "unknown-value", value: "East" },
    });
    const lagged = modelOf({ a: { transform: { kind: "lag", periods: 1 } } }, { kind: "time", order: "month" });
    expect(ask(sourceOf({ a: [1] }), lagged)).toMatchObject({ ok: true, value: { kind: "not-applicable" } });
    expect(inquire({ source, model: { ...model, drivers: [] } }, { kind: "row by row" })).toMatchObject({ ok: false });
  });
});
