import { describe, expect, it } from "vitest";
import { analyse } from "../../../src/core/answer/analyse.ts";
import type { Answer } from "../../../src/core/answer/answer.ts";
import { defaultOptions } from "../../../src/core/answer/options.ts";
import type { Model } from "../../../src/core/design/model.ts";
import { drawsFrom } from "../../../src/sheet/sample/draws.ts";
import { driver, modelWith } from "../../support/models.ts";
import { must, sourceOf } from "../../support/sheet.ts";

const draws = drawsFrom(11);
const price = Array.from({ length: 60 }, () => 10 + 4 * draws.normal());
const source = sourceOf({
  Repairs: price.map((one) => 90 + 3 * one - 0.1 * one * one + 2 * draws.normal()),
  Price: price,
  Rain: price.map(() => draws.normal()),
  Region: price.map((_, row) => ["North", "South", "West"][((row * row) % 7) % 3]!),
});

const answerTo = (model: Partial<Model>): Answer =>
  must(analyse({ source, model: modelWith(model), options: defaultOptions }, () => undefined));

const square = { kind: "square" } as const;

describe("a driver that enters with its square", () => {
  it("is not read by one of its two coefficients alone", () => {
    const { drivers } = answerTo({
      drivers: [driver("Price"), driver("Price", { transform: square }), driver("Rain")],
    });
    const ends = drivers.map(({ sentence }) =>
      /what a step in it goes with differs along the way/.test(sentence ?? ""),
    );
    expect(ends).toEqual([false, true, true, false]);
    const logged = answerTo({
      outcome: { column: "Repairs", transform: { kind: "logarithm" } },
      drivers: [driver("Rain", { transform: square })],
    });
    expect(logged.title).toBe("Logarithm of Repairs explained by square of Rain");
    expect(logged.drivers[1]!.sentence).toMatch(/^Square of Rain: no effect can be shown/);
  });

  it("is read as ever where the square, or another form, enters alone", () => {
    const alone = answerTo({ drivers: [driver("Price", { transform: square })] });
    const lagged = answerTo({
      drivers: [driver("Price"), driver("Price", { transform: { kind: "lag", periods: 1 } })],
      rows: { kind: "time", order: null },
    });
    const said = [alone, lagged].flatMap(({ verdict }) => verdict).join(" ");
    expect(said).not.toContain("along the way");
  });
});

it("periods without a row are counted in how many there are", () => {
  const gapped = sourceOf({
    Month: price.map((_, row) => `${2020 + Math.floor(row / 12)}-${String((row % 12) + 1).padStart(2, "0")}`),
    Repairs: price.map((one, row) => (row === 3 ? null : 90 + 3 * one + draws.normal())),
    Price: price,
  });
  const opening = (rows: Model["rows"]): string | undefined =>
    must(analyse({ source: gapped, model: modelWith({ rows }), options: defaultOptions }, () => undefined)).verdict[0];
  expect(opening({ kind: "time", order: "Month" })).toMatch(
    / over 59 of 60 months from January 2020 to December 2024: /,
  );
  expect(opening({ kind: "cases" })).toMatch(/ over 59 separate cases: /);
});

it("a driver of categories stands once in the title, and each of its terms has a sentence", () => {
  const { title, verdict, terms } = answerTo({ drivers: [driver("Price"), driver("Region", { as: "category" })] });
  expect(terms.filter((term) => term.startsWith("Region: "))).toHaveLength(2);
  expect(title).toBe("Repairs explained by Price and Region");
  expect(verdict[0]).toMatch(
    /^Repairs explained by Price and Region over 60 separate cases: together they account for /,
  );
  expect(verdict.filter((sentence) => /^Region(:| )/.test(sentence))).toHaveLength(2);
});
