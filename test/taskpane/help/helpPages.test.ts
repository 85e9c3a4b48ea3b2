import { describe, expect, it } from "vitest";
import { lagLadder } from "../../../src/core/robustness/choices.ts";
import { tQuantile } from "../../../src/core/numeric/distributions.ts";
import { policies } from "../../../src/core/decision/policies.ts";
import { concepts, helpPages } from "../../../src/taskpane/help/concepts.ts";
import type { HelpPage } from "../../../src/taskpane/help/helpPage.ts";

const textOf = ({ title, parts }: HelpPage): string =>
  [title, ...parts.flatMap((part) => (typeof part === "string" ? [part] : part.terms.flat()))].join(" ");

describe.each(concepts.map((concept) => [concept, helpPages[concept]] as const))("the page on %s", (_, page) => {
  it("can be read in a minute or two", () => {
    expect(textOf(page).split(/\s+/).length).toBeLessThan(330);
  });

  it("speaks no more surely than the evidence, and of no symbols", () => {
    expect(textOf(page)).not.toMatch(/\b(proves?|proven|accept(s|ed)?|significan(t|ce))\b/i);
    expect(textOf(page)).not.toMatch(/[σβεΣ√²]/u);
  });
});

describe("what the pages say", () => {
  it("are the policies as they are", () => {
    const words = textOf(helpPages["four cases"]);
    expect(words).toContain(`held to ${100 * policies.careful.testLevel} %`);
    expect(words).toContain(`held to ${100 * policies.textbook.testLevel} %`);
  });

  it("are the limits of t and of fixed-b as they are", () => {
    const words = textOf(helpPages["reference distribution"]);
    for (const df of [10, 100]) expect(words).toContain(tQuantile(0.975, df).toFixed(2));
    // Kiefer and Vogelsang (2005), Bartlett, two-sided 5 %: 1.9600 + 2.9694 b + 0.4160 b^2 - 0.5324 b^3 at b = 0.1.
    expect(words).toContain((1.96 + 2.9694 * 0.1 + 0.416 * 0.01 - 0.5324 * 0.001).toFixed(2));
  });

  it("are the lags that firmness looks at as they are", () => {
    const ladder = lagLadder(12, { rowCount: 96, columnCount: 4 });
    expect([ladder[0], ladder.at(-1)! > 2 * 12]).toEqual([0, true]);
    expect(textOf(helpPages.firm)).toContain("from no lags up to more than twice as many");
  });
});
