import { describe, expect, it } from "vitest";
import type { ColumnSetup, Role } from "../../src/app/setup.ts";
import { shownColumns } from "../../src/taskpane/data/shownColumns.ts";
import { columnSetup } from "../support/columnSetup.ts";

const column = (name: string, role: Role = "unused"): ColumnSetup => columnSetup(name, { role });

const columns = [column("Price"), column("Rain"), column("Old price"), column("Staff"), column("Takings", "outcome")];

describe("the columns that are listed", () => {
  it("are the first ones and those that take part", () => {
    expect(shownColumns(columns, "", 2)).toEqual({ shown: [0, 1, 4], hidden: 2 });
    expect(shownColumns(columns, "", 5)).toEqual({ shown: [0, 1, 2, 3, 4], hidden: 0 });
  });

  it("are those with what is looked for in their names", () => {
    expect(shownColumns(columns, " PRICE ", 40)).toEqual({ shown: [0, 2], hidden: 0 });
    expect(shownColumns(columns, "price", 1)).toEqual({ shown: [0], hidden: 1 });
    expect(shownColumns(columns, "fuel", 40)).toEqual({ shown: [], hidden: 0 });
  });
});
