import { describe, expect, it } from "vitest";
import type { BookCell, BookValue, SheetData } from "../../../src/desk/book/bookData.ts";
import { demoBook } from "../../../src/desk/demo/demoBook.ts";
import { monthlyRepairs } from "../../../src/sheet/sample/months.ts";
import { ordinaryFit } from "../../../src/desk/demo/ordinaryFit.ts";

const book = demoBook();
const sheet = (name: string): SheetData => book.sheets.find((one) => one.name === name)!;
const valueOf = (cell: BookCell | undefined): BookValue =>
  typeof cell === "object" && cell !== null && "value" in cell ? cell.value : (cell ?? null);
const valuesOf = (name: string): readonly (readonly BookValue[])[] => sheet(name).rows.map((row) => row.map(valueOf));

/** The values below a heading, wherever in the sheet it stands. */
function column(name: string, heading: string): readonly BookValue[] {
  const rows = valuesOf(name);
  const top = rows.findIndex((row) => row.includes(heading));
  return rows.slice(top + 1).map((row) => row[rows[top]!.indexOf(heading)] ?? null);
}

describe("the demo workbook", () => {
  it("is the same every time", () => {
    expect(demoBook()).toEqual(book);
  });

  it.each([
    ["Months", 96, ["Repairs", "Price index", "Advertising", "Rainy days"]],
    ["Shops", 140, ["Takings", "Staff hours", "Floor area", "Footfall"]],
    ["Parts", 60, ["Unit cost", "Lot size", "Lead time"]],
    ["Weeks", 156, ["Courier cost", "Parcels", "Fuel"]],
  ] as const)("%s has %i rows of numbers under each heading", (name, count, headings) => {
    for (const heading of headings) {
      const values = column(name, heading);
      expect(values).toHaveLength(count);
      expect(values.every((value) => typeof value === "number" && Number.isFinite(value) && value > 0)).toBe(true);
      expect(new Set(values).size).toBeGreaterThan(10);
    }
  });

  it("has real dates without gaps", () => {
    const firstOfMonth = (serial: BookValue): string =>
      new Date(Number(serial) * 86_400_000 - 25_569 * 86_400_000).toISOString();
    const months = column("Months", "Month").map(firstOfMonth);
    expect(months[0]).toBe("2016-01-01T00:00:00.000Z");
    expect(months.at(-1)).toBe("2023-12-01T00:00:00.000Z");
    expect(new Set(months).size).toBe(96);
    const weeks = column("Weeks", "Week from").map(Number);
    expect(weeks.slice(1).every((week, index) => week - weeks[index]! === 7)).toBe(true);
  });

  it("opens on the months, headings in view, tables and names over whole blocks", () => {
    expect(book.active).toBe(0);
    expect(sheet("Months").frozenRows).toBe(4);
    expect(sheet("Shops").tables).toEqual([{ name: "Shop_figures", address: "A1:E141" }]);
    expect(book.names[0]!.refersTo).toBe("Parts!$A$4:$D$64");
    expect(valuesOf("Parts")[3]).toEqual(["Lot", "Unit cost", "Lot size", "Lead time"]);
    expect(valuesOf("Parts")).toHaveLength(64);
  });
});

describe("the handover", () => {
  const reported = (heading: string): readonly number[] => column("Handover", heading).slice(0, 4).map(Number);

  it("reports a fit of all months but the last, rounded as shown", () => {
    const months = monthlyRepairs().slice(0, -1);
    const fit = ordinaryFit(
      months.map(({ repairs }) => repairs),
      [months.map((m) => m.priceIndex), months.map((m) => m.advertising), months.map((m) => m.rainyDays)],
    );
    reported("Coefficient").forEach((value, i) => expect(value).toBeCloseTo(fit.coefficients[i]!, 3));
    reported("Standard error").forEach((value, i) => expect(value).toBeCloseTo(fit.standardErrors[i]!, 3));
    expect(valuesOf("Handover").find(([label]) => label === "Observations")).toEqual(["Observations", 95]);
  });

  it("would read otherwise with the month that was left off", () => {
    const months = monthlyRepairs();
    const fit = ordinaryFit(
      months.map(({ repairs }) => repairs),
      [months.map((m) => m.priceIndex), months.map((m) => m.advertising), months.map((m) => m.rainyDays)],
    );
    reported("Standard error").forEach((value, i) =>
      expect(Math.abs(value - fit.standardErrors[i]!)).toBeGreaterThan(0.001),
    );
  });

  it("calls the price effect real, as a ratio beyond 2", () => {
    expect(Math.abs(reported("t ratio")[1]!)).toBeGreaterThan(2);
  });
});

describe("the least squares of the demo", () => {
  it("finds a line worked out by hand", () => {
    // y = 1, 3, 2, 5 on x = 0, 1, 2, 3: slope 11/10, constant 11/10, residual squares 27/10, total squares 35/4.
    const fit = ordinaryFit([1, 3, 2, 5], [[0, 1, 2, 3]]);
    expect(fit.coefficients[0]).toBeCloseTo(1.1, 12);
    expect(fit.coefficients[1]).toBeCloseTo(1.1, 12);
    expect(fit.standardErrors[1]).toBeCloseTo(Math.sqrt(2.7 / 2 / 5), 12);
    expect(fit.standardErrors[0]).toBeCloseTo(Math.sqrt((2.7 / 2) * (14 / 20)), 12);
    expect(fit.rSquared).toBeCloseTo(1 - 2.7 / 8.75, 12);
  });
});
