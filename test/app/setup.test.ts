import { describe, expect, it } from "vitest";
import {
  type ColumnSetup,
  type Role,
  type Setup,
  assignRole,
  changeColumn,
  columnWithRole,
} from "../../src/app/setup.ts";
import { defaultOptions } from "../../src/core/answer/options.ts";
import { columnSetup } from "../support/columnSetup.ts";

const column = (name: string, role: Role): ColumnSetup => columnSetup(name, { role });

const setup: Setup = {
  columns: [column("Month", "time"), column("Repairs", "outcome"), column("Price", "driver"), column("Shop", "unused")],
  rows: "cases",
  rowsGuessed: true,
  constant: true,
  visibleOnly: false,
  calendar: [],
  options: defaultOptions,
};

const roles = ({ columns }: Setup): Record<string, Role> =>
  Object.fromEntries(columns.map(({ column, role }) => [column, role]));

describe("roles", () => {
  it("swaps outcome and driver", () => {
    const after = assignRole(setup, "Price", "outcome");
    expect(roles(after)).toEqual({ Month: "time", Repairs: "driver", Price: "outcome", Shop: "unused" });
  });

  it("leaves a former outcome unused where the new one was no driver", () => {
    expect(roles(assignRole(setup, "Shop", "outcome"))).toMatchObject({ Repairs: "unused", Shop: "outcome" });
  });

  it("has one time column, and the former one is not used", () => {
    expect(roles(assignRole(setup, "Shop", "time"))).toMatchObject({ Month: "unused", Shop: "time" });
  });

  it("lets any number of columns be drivers", () => {
    expect(roles(assignRole(setup, "Shop", "driver"))).toMatchObject({ Price: "driver", Shop: "driver" });
  });

  it("marks as chosen what was chosen or moved by the choice, and nothing else", () => {
    const after = assignRole(setup, "Price", "outcome");
    expect(after.columns.filter(({ guessed }) => !guessed).map(({ column }) => column)).toEqual(["Repairs", "Price"]);
  });

  it("makes the rows what a time or group column tells", () => {
    expect(assignRole(setup, "Shop", "group")).toMatchObject({ rows: "groups", rowsGuessed: false });
    expect(assignRole(setup, "Shop", "time")).toMatchObject({ rows: "time", rowsGuessed: false });
    expect(assignRole({ ...setup, rows: "groups" }, "Shop", "time").rows).toBe("groups");
    expect(assignRole(setup, "Shop", "driver")).toMatchObject({ rows: "cases", rowsGuessed: true });
  });

  it("changes nothing where the role is the one it has, or the column is not known", () => {
    expect(assignRole(setup, "Price", "driver")).toBe(setup);
    expect(assignRole(setup, "Nothing", "driver")).toBe(setup);
  });

  it("finds the column with a role", () => {
    expect(columnWithRole(setup, "time")).toBe("Month");
    expect(columnWithRole(setup, "group")).toBeNull();
  });
});

it("changes the details of one column alone", () => {
  const after = changeColumn(setup, "Price", { unit: "euro", against: -1 });
  expect(after.columns[2]).toEqual({ ...setup.columns[2], unit: "euro", against: -1 });
  expect(after.columns.filter((_, index) => index !== 2)).toEqual(setup.columns.filter((_, index) => index !== 2));
});
