import { createHash } from "node:crypto";
import { describe, expect, it } from "vitest";
import { fingerprint, shortFingerprint } from "../../src/app/fingerprint.ts";
import type { Cell, CellColumn } from "../../src/core/table/cells.ts";
import type { Column } from "../../src/core/table/source.ts";
import { toCellColumn } from "../support/cellColumns.ts";

const column = (name: string, cells: CellColumn, firstRow = 1): Column => ({
  name,
  place: { kind: "sheet", sheet: "Months", column: 0, firstRow },
  cells,
});
const of = (name: string, ...cells: Cell[]): Column => column(name, toCellColumn(cells));

const mixed: readonly Cell[] = [1.5, "a", null, { error: "#N/A" }, true, { date: 45292 }, "b", "a", -3e-300];

describe("fingerprint", () => {
  it("is SHA-256 over kinds, numbers, heading, height and texts, column by column", async () => {
    const numbers = Buffer.alloc(16);
    numbers.writeDoubleLE(12.25, 0);
    numbers.writeDoubleLE(0, 8);
    const bytes = Buffer.concat([Buffer.from([1, 2]), numbers, Buffer.from(JSON.stringify(["Price", 2, ["n"]]))]);
    const expected = createHash("sha256").update(createHash("sha256").update(bytes).digest()).digest("hex");
    expect(await fingerprint([of("Price", 12.25, "n")])).toBe(expected);
  });

  it("does not depend on where the cells stand, how texts are numbered or the sign of a zero", async () => {
    const known = await fingerprint([of("Price", ...mixed), of("Rain", 0)]);
    const { kinds } = toCellColumn(mixed);
    const renumbered = {
      kinds,
      numbers: new Float64Array([1.5, 2, 7, 0, 1, 45292, 1, 2, -3e-300]),
      texts: ["#N/A", "b", "a"],
    };
    expect(await fingerprint([column("Price", renumbered, 40), of("Rain", -0)])).toBe(known);
  });

  it("changes with any cell, kind, heading or order", async () => {
    const variants: readonly (readonly Column[])[] = [
      [of("Price", ...mixed)],
      [of("Cost", ...mixed)],
      ...mixed.map((cell, row) => [of("Price", ...mixed.with(row, cell === null ? 0 : null))]),
      [of("Price", ...mixed.with(1, { error: "a" }))],
      [of("Price", ...mixed.with(4, 1))],
      [of("Price", ...mixed.with(5, 45292))],
      [of("Price", ...mixed, null)],
      [of("Price", ...mixed), of("Rain", 7)],
      [of("Rain", 7), of("Price", ...mixed)],
    ];
    const all = await Promise.all(variants.map(fingerprint));
    expect(new Set(all).size).toBe(variants.length);
    expect(all.every((text) => /^[0-9a-f]{64}$/.test(text))).toBe(true);
    expect(shortFingerprint(all[0]!)).toHaveLength(16);
  });
});
