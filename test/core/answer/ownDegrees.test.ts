import { describe, expect, it } from "vitest";
import { analyse } from "../../../src/core/answer/analyse.ts";
import type { Answer } from "../../../src/core/answer/answer.ts";
import { readSettings } from "../../../src/core/answer/settings.ts";
import { choiceText, lawsInWords } from "../../../src/core/answer/tables.ts";
import type { Model } from "../../../src/core/design/model.ts";
import { tTwoSided } from "../../../src/core/numeric/distributions.ts";
import type { Source } from "../../../src/core/table/source.ts";
import { answerJson } from "../../../src/terminal/answerJson.ts";
import { pValuesAgainst } from "../../../src/functions/kinds.ts";
import { driver, modelWith } from "../../support/models.ts";
import { toCellColumn } from "../../support/cellColumns.ts";

const n = 40;
const columns = {
  Repairs: Array.from({ length: n }, (_, i) => 20 + ((i * 29) % 19) / 3 - i / 9),
  Price: Array.from({ length: n }, (_, i) => Math.exp(((i * 7) % 11) / 3)),
  Rain: Array.from({ length: n }, (_, i) => ((i * 13) % 17) - 5),
  Shop: Array.from({ length: n }, (_, i) => `Shop ${Math.floor(i / 6)}`),
};
const source: Source = {
  rowCount: n,
  columns: Object.entries(columns).map(([name, cells], column) => ({
    name,
    place: { kind: "argument", argument: "data", column, firstRow: 1 },
    cells: toCellColumn(cells),
  })),
};

function answerWith(settings: readonly (readonly [string, string])[], rows: Model["rows"]): Answer {
  const read = readSettings(settings);
  if (!read.ok) throw new Error(read.problem.code);
  const model = modelWith({ drivers: [driver("Price"), driver("Rain")], rows });
  const answer = analyse({ source, model, options: read.value.options }, () => undefined);
  if (!answer.ok) throw new Error(answer.problem.code);
  return answer.value;
}

const inShops = { kind: "groups", by: "Shop", second: null, order: null } as const;

describe.each([
  {
    name: "HC2 with Bell and McCaffrey's",
    settings: [
      ["white version", "HC2 bell-mccaffrey"],
      ["errors", "White"],
      ["policy", "textbook"],
    ] as const,
    rows: { kind: "cases" } as Model["rows"],
    named: "White (HC2, degrees of freedom of Bell and McCaffrey)",
  },
  {
    name: "CR2 with Satterthwaite's",
    settings: [["grouped version", "CR2"]] as const,
    rows: inShops as Model["rows"],
    named: "Grouped (CR2)",
  },
])("degrees of freedom by coefficient in an answer, $name", ({ settings, rows, named }) => {
  const answer = answerWith(settings, rows);
  const { inForce } = answer.inference;
  const degrees = inForce.degreesOfFreedom!;

  it("are what each driver's p-value in force is held against", () => {
    expect(new Set(degrees).size).toBe(3);
    answer.drivers.forEach(({ pValue, ratio }, j) => expect(pValue).toBeCloseTo(tTwoSided(ratio, degrees[j]!), 13));
  });

  it("are said in words and in the terminal's JSON, never one number for all", () => {
    const digits = (value: number): string => String(Number(value.toFixed(2)));
    const [least, most] = [Math.min(...degrees), Math.max(...degrees)].map(digits);
    expect(choiceText(answer)).toBe(`${named}, ratio against t(${least}) to t(${most}), each coefficient its own`);
    expect(answer.verdict[1]).toContain(named.slice(1));
    expect(answerJson(answer)).toMatchObject({ choice: { degreesOfFreedom: degrees } });
  });

  it("are what p-values against other values are held against", () => {
    const against = pValuesAgainst(answer, inForce, 0.5);
    answer.coefficients.forEach((b, j) => {
      const ratio = (b - 0.5) / inForce.standardErrors[j]!;
      expect(against.ok && against.value[j]).toBeCloseTo(tTwoSided(ratio, degrees[j]!), 13);
    });
  });
});

describe("degrees of freedom that all coefficients share", () => {
  it("are one number", () => {
    const answer = answerWith([], inShops);
    expect(choiceText(answer)).toBe("Grouped (CR1), ratio against t(6)");
    expect(answerJson(answer)).toMatchObject({ choice: { degreesOfFreedom: [6, 6, 6] } });
    expect(lawsInWords(answer.inference.classical)).toBe("t(37)");
    expect(answerJson(answerWith([], { kind: "cases" }))).toMatchObject({ choice: { degreesOfFreedom: null } });
  });
});
