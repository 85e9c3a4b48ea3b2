import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { listedFunctions } from "../../src/functions/listed.ts";

const readme = readFileSync(new URL("../../README.md", import.meta.url), "utf8");

const rows = [...readme.matchAll(/^\| `(FOOTING\.[^`]+)` \| (.+) \|$/gm)];

describe("the README's table of functions", () => {
  it("has the functions, parameters and order of the function table", () => {
    expect(rows.map(([, written]) => `=${written!}`)).toEqual(listedFunctions.map(({ call }) => call));
  });

  it("says of each what it gives, in words of its own", () => {
    const gives = rows.map(([, , words]) => words!);
    for (const words of gives) expect(words).toMatch(/[a-z]{3,}/);
    expect(new Set(gives).size).toBe(listedFunctions.length);
  });
});
