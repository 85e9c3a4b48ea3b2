import { describe, expect, it } from "vitest";
import { describeColumn } from "../../src/core/table/describe.ts";
import type { Cell } from "../../src/core/table/cells.ts";
import { holdsInWords, unusableCells } from "../../src/taskpane/data/columnWords.ts";
import { derivationInWords } from "../../src/taskpane/answer/derivation.ts";
import { intervalsInWords, kindFigures, lawsInWords, writerFor } from "../../src/taskpane/answer/driverFigures.ts";
import { correlationsInWords, quantilesInWords } from "../../src/taskpane/evidence/shapeWords.ts";
import { applies, groupTests, keptOut, readingOfGroup } from "../../src/taskpane/evidence/testGroups.ts";
import { largestResiduals, overFittedInWords, overRowsInWords } from "../../src/taskpane/evidence/residualWords.ts";
import { keepTogether } from "../../src/taskpane/parts/keepTogether.ts";
import { pFigure } from "../../src/taskpane/parts/pFigure.ts";
import { rowsInWords } from "../../src/taskpane/parts/rowWords.ts";
import { answerFixture } from "../support/answerFixture.ts";
import { columnOf, day } from "../support/sheet.ts";
import { columnSetup } from "../support/columnSetup.ts";

const describing = (name: string, cells: readonly Cell[]) => describeColumn(columnOf(name, cells));
const shops = ["North", "South", "North", "South", "North", "South"];

describe("what a column holds", () => {
  it.each([
    ["3 numbers", [4, 7, 9]],
    ["3 numbers that count the rows", [1, 2, 3]],
    ["2 numbers, all the same", [5, null, 5]],
    ["2 dates", [day(2020, 1, 1), day(2020, 2, 1)]],
    ["2 categories", shops],
    ["text, 4 different", ["alpha", "beta", "gamma", "delta"]],
  ] as const)("%s", (words, cells) => {
    expect(holdsInWords(describing("Column", cells))).toBe(words);
  });
});

describe("cells that cannot be used", () => {
  const setup = columnSetup("Price", { role: "driver", guessed: false });
  const column = describing("Price", [4, "7.5", null, 9, "n/a", 3, 8, 2, 5, 6]);

  it("are listed with what they hold", () => {
    expect(unusableCells(column, setup)).toEqual({
      count: 3,
      cells: [
        { address: "Months!A3", value: "7.5" },
        { address: "Months!A4", value: "" },
        { address: "Months!A6", value: "n/a" },
      ],
    });
  });

  it("are fewer once text may be read as numbers", () => {
    const agreed = unusableCells(column, { ...setup, textNumbers: "." });
    expect(agreed.count).toBe(2);
    expect(agreed.cells.map(({ address }) => address)).toEqual(["Months!A4", "Months!A6"]);
  });
});

describe("rows in words", () => {
  it("tell period and gaps, and how many gaps are not named", () => {
    const period = { name: "monthly", unit: "month", season: 12 };
    const rows = {
      kind: "time",
      period,
      first: "May 2020",
      last: "June 2022",
      gaps: 3,
      gapLabels: ["July 2020"],
    } as const;
    expect(rowsInWords(rows)).toBe("monthly from May 2020 to June 2022, 3 gaps: July 2020, 2 more");
    expect(rowsInWords({ ...rows, gaps: 0, gapLabels: [] })).toBe("monthly from May 2020 to June 2022, no gaps");
    const inShops = { kind: "groups", by: "Shop", groups: 7 } as const;
    expect(rowsInWords({ ...inShops, second: null })).toBe("in 7 groups by Shop");
    expect(rowsInWords({ ...inShops, second: { by: "Year", groups: 9 } })).toBe("in 7 groups by Shop and 9 by Year");
  });
});

describe("figures of a driver", () => {
  it("stand under their kinds, the one in force as it counts", () => {
    const { inference } = answerFixture;
    const inForce = { ...inference.inForce, pValue: [0.001, 0.0625, 0.3] };
    const figures = kindFigures({ ...answerFixture, inference: { ...inference, inForce } }, 1);
    expect(figures.map(({ label, inForce }) => [label, inForce])).toEqual([
      ["classical", false],
      ["White", false],
      ["Newey-West", true],
    ]);
    expect(figures[0]).toMatchObject({ low: -5, high: 0, reference: "t(46)" });
    expect(figures[2]).toMatchObject({ low: -7, high: 2, pValue: 0.0625, pValueNormal: 0.0242 });
  });

  it("are written to what the interval supports, with a minus sign", () => {
    expect(writerFor({ low: -2.5, high: -2.1 })(-2.3456)).toBe("−2.35");
    expect(writerFor({ low: 900, high: 1700 })(1288)).toBe("1,290");
  });

  it("say what their ratios are held against, kinds with the same law together", () => {
    const kinds = kindFigures(answerFixture, 1);
    expect(lawsInWords(kinds)).toBe(
      "Ratios are held against a distribution: classical against t(46), White against t(47), Newey-West against t(48).",
    );
    const alike = kinds.map((one) => (one.kind === "white" ? { ...one, reference: "t(46)" } : one));
    expect(lawsInWords(alike)).toContain(": classical and White against t(46), Newey-West against t(48).");
  });

  it("are told to those who do not see the picture", () => {
    expect(intervalsInWords(answerFixture, 1)).toBe(
      "95 % intervals of Price: classical from −5.0 to 0.0; White from −6.0 to 1.0; Newey-West (in force) from −7.0 to 2.0.",
    );
  });

  it("show p-values without their name", () => {
    expect([pFigure(0.0341, 0.05), pFigure(0.00001, 0.05)]).toEqual(["0.034", "<\u00a00.0001"]);
  });
});

it("signs stay with their numbers in sentences, and a minus is one", () => {
  expect(keepTogether("the estimate is -1.13 (between -1.42 and 2, 95 %), p = 0.03; 2020-01")).toBe(
    "the estimate is −1.13 (between −1.42 and 2, 95\u00a0%), p\u00a0=\u00a00.03; 2020-01",
  );
});

describe("how a figure came about", () => {
  it("goes from rows to ratio, p-value, level and interval", () => {
    const driver = { ...answerFixture.drivers[1]!, coefficient: -2.5, standardError: 1.25, ratio: -2, against: 0 };
    const drivers = [answerFixture.drivers[0]!, { ...driver, pValue: 0.0625, low: -7, high: 2 }];
    const steps = derivationInWords({ ...answerFixture, drivers }, 1);
    expect(steps[0]).toMatch(/^\d+ rows, \d+ coefficients: \d+ degrees of freedom\.$/);
    expect(steps[1]).toMatch(
      /^The coefficient −2\.500, less the tested value 0, divided by its Newey-West .* standard error 1\.250, is the ratio −2\.00\.$/,
    );
    expect(steps[2]).toContain("p = 0.063. That is not below the level 0.05: an effect is not shown.");
    expect(steps[3]).toBe("The 95 % interval from −7.0 to 2.0 comes from the same distribution.");
  });
});

describe("tests by name", () => {
  const groups = groupTests(answerFixture);

  it("have their orders together, and those that decided first", () => {
    expect(groups.map(({ test, decided, outcomes }) => [test, decided, outcomes.length])).toEqual([
      ["koenker", true, 1],
      ["breusch-godfrey", false, 2],
      ["white", false, 1],
    ]);
  });

  it("decide nothing where their question is not asked, as for rows in groups", () => {
    const { decision } = answerFixture;
    const fourCase = { spread: "not asked", followOn: "not asked" } as const;
    const asked = groupTests({ ...answerFixture, decision: { ...decision, fourCase } });
    expect(asked.map(({ decided }) => decided)).toEqual([false, false, false]);
  });

  it("that say nothing stand together under their reason", () => {
    expect(groups.map(applies)).toEqual([true, true, false]);
    expect(keptOut(groups)).toEqual([{ because: "too few rows for its columns", titles: ["White's test"] }]);
  });

  it("say why one does not apply", () => {
    expect(readingOfGroup(groups[2]!, answerFixture)).toBe("Does not apply: too few rows for its columns");
    expect(readingOfGroup(groups[0]!, answerFixture)).toContain("changes with the drivers");
  });
});

describe("residuals in words", () => {
  const points = {
    fitted: [10, 30, 20, 40],
    residuals: [1, -3, 2, 4],
    rows: [5, 3, 4, 2],
    periods: [4, 2, 3, 1],
    thinned: false,
  };

  it("tell the range and the spread at either end", () => {
    expect(overFittedInWords(points)).toContain("from -3 to 4");
    expect(overFittedInWords(points)).toContain(
      "smallest fitted values they spread by 1, among the third with the largest by 4",
    );
  });

  it("tell how often neighbours are on the same side", () => {
    expect(overRowsInWords(points)).toContain("Of 3 neighbouring pairs, 1 lie on the same side");
  });

  it("name the rows that are farthest off", () => {
    expect(largestResiduals(points, 2)).toEqual([
      { row: 2, words: "4 above the fitted 40" },
      { row: 3, words: "3 below the fitted 30" },
    ]);
  });
});

describe("the shape of the residuals in words", () => {
  it("names the lags outside the bounds", () => {
    expect(correlationsInWords({ values: [0.5, -0.25, -0.4], bound: 0.28 })).toBe(
      "Correlations of the residuals with their own past at lags 1 to 3, bounds ±0.28; outside the bounds: lag 1 (0.5) and lag 3 (−0.4).",
    );
    expect(correlationsInWords({ values: [0.1], bound: 0.28 })).toContain("none is outside the bounds");
  });

  it("tells how far the ends are from a normal law", () => {
    expect(quantilesInWords({ residuals: [-5.25, 1, 3], normal: [-4, 0, 4] })).toBe(
      "Residuals in order against a normal law of the same spread: the smallest is −5.25 where a normal law has −4, the largest 3 where a normal law has 4.",
    );
  });
});
