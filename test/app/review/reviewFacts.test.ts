import { expect, it } from "vitest";
import { fingerprint } from "../../../src/app/fingerprint.ts";
import { fingerprintOfClaim, reviewFactsOf } from "../../../src/app/review/reviewFacts.ts";
import { claimFixture } from "../../support/reviewFixture.ts";
import { toCellColumn } from "../../support/cellColumns.ts";

const edition = { today: () => "1 December 2026", version: "0.1.0" };

it("the fingerprint is that of the claimed cells under their names, wherever they stand", async () => {
  const column = (name: string, start: number) => ({
    name,
    place: { kind: "sheet", sheet: "Elsewhere", column: 7, firstRow: 0 } as const,
    cells: toCellColumn([0, 1, 2, 3, 4].map((row) => start + row * row)),
  });
  const expected = await fingerprint([column("Repairs", 410), column("Price index", 97)]);
  expect(await fingerprintOfClaim(claimFixture)).toBe(expected);
  const shorter = { ...claimFixture, outcome: { ...claimFixture.outcome, count: 4 } };
  expect(await fingerprintOfClaim(shorter)).not.toBe(expected);
  expect(await reviewFactsOf([claimFixture], edition)).toEqual({
    date: "1 December 2026",
    version: "0.1.0",
    fingerprints: [expected],
  });
});
