import { describe, expect, it } from "vitest";
import { cellOf, rangeOf, rowNumberOf } from "../../../src/core/table/place.ts";

describe("places", () => {
  const sheet = { kind: "sheet", sheet: "My data", column: 2, firstRow: 3 } as const;
  const argument = { kind: "argument", argument: "drivers", column: 1, firstRow: 1 } as const;

  it("names cells as the user knows them", () => {
    expect(cellOf(sheet, 10)).toBe("'My data'!C14");
    expect(cellOf(argument, 11)).toBe("row 13 of drivers, column 2");
  });

  it("names columns of data", () => {
    expect(rangeOf(sheet, 94)).toBe("'My data'!C4:C97");
    expect(rangeOf(argument, 94)).toBe("column 2 of drivers");
  });

  it("counts rows from 1 at the top of sheet or argument", () => {
    expect([rowNumberOf(sheet, 0), rowNumberOf(argument, 0)]).toEqual([4, 2]);
  });
});
