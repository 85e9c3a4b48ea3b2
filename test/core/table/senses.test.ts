import { describe, expect, it } from "vitest";
import { countSenses, isMissingMark, picked, sense, sensesOf } from "../../../src/core/table/senses.ts";
import { toCellColumn } from "../../support/cellColumns.ts";

describe("the sense of a cell", () => {
  it("tells the kinds apart", () => {
    const cells = toCellColumn([null, 5, { date: 45_000 }, true, "NA", "1,5", "north", { error: "#REF!" }]);
    expect([...sensesOf(cells)]).toEqual([
      sense.blank,
      sense.number,
      sense.date,
      sense.boolean,
      sense.mark,
      sense.textNumber,
      sense.text,
      sense.error,
    ]);
  });

  it.each(["NA", "N/A", "n/a", "NaN", "null", "none", "None", "-", "–", "—", ".", "?", "#N/A", " NA "])(
    "takes %s for a missing value",
    (text) => {
      expect(isMissingMark(text)).toBe(true);
      expect([...sensesOf(toCellColumn([text]))]).toEqual([sense.mark]);
    },
  );

  it.each(["nab", "--", "..", "0", "no", "x"])("does not take %s for one", (text) => {
    expect(isMissingMark(text)).toBe(false);
  });

  it("takes the error #N/A for missing and every other error for an error, kept as text or not", () => {
    const cells = toCellColumn([{ error: "#N/A" }, { error: "#DIV/0!" }, "#DIV/0!", { error: "#NA?" }]);
    expect([...sensesOf(cells)]).toEqual([sense.mark, sense.error, sense.error, sense.error]);
  });

  it("takes text of blanks for blank", () => {
    expect([...sensesOf(toCellColumn(["  ", "\u00a0", "\n"]))]).toEqual([sense.blank, sense.blank, sense.blank]);
  });

  it("counts senses and picks values by them", () => {
    const cells = toCellColumn([3, "a", 5, null]);
    const senses = sensesOf(cells);
    expect(countSenses(senses)[sense.number]).toBe(2);
    expect([...picked(cells.numbers, senses, sense.number)]).toEqual([3, 5]);
  });
});
