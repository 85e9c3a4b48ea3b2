import { describe, expect, it } from "vitest";
import { type Kept, partText, readKept } from "../../../src/app/stored/parts.ts";
import type { StoredBook } from "../../../src/app/stored/storedBook.ts";
import type { Setup } from "../../../src/app/setup.ts";
import { proposeSetup } from "../../../src/app/proposal.ts";
import { defaultOptions } from "../../../src/core/answer/options.ts";
import { describeColumn } from "../../../src/core/table/describe.ts";
import { sourceOf } from "../../support/sheet.ts";

const { columns } = sourceOf({
  'Price & "cost" <€>': [1, 2, 4],
  Repairs: [7, 9, 8],
  "Ende\u0001\uFFFE\uD800": ["a", "b", "a"],
});
const proposed = proposeSetup(columns.map(describeColumn));
// Units and tested values stand with their columns.
const own = Object.entries(defaultOptions).filter(([key]) => key !== "units" && key !== "against");
const options = Object.fromEntries(own) as Setup["options"];
const setup: Setup = { ...proposed, options };
const anchor = { kind: "name", name: "Footing_data_1" } as const;
const book: StoredBook = {
  setups: [{ name: "A & B <1>", anchor, address: "'My data'!A1:C4", setup }],
  sheets: [
    {
      id: "x1",
      kind: "kept",
      setup: { ...setup, options: { ...setup.options, lags: { kind: "given", lags: 3 } } },
      anchor,
      address: "'My data'!A1:C4",
      fingerprint: "ab",
      written: [{ row: 0, column: 0, rows: 1, columns: 1, marks: "AbC9" }],
    },
    { id: "x2", kind: "live", setup, anchor, address: "'My data'!A1:C4", fingerprint: "cd", written: null },
  ],
  comparisons: [
    {
      id: "x3",
      kind: "comparison",
      models: [
        { name: "A", setup, anchor, address: "'My data'!A1:C4", fingerprint: "ef" },
        { name: "B", setup, anchor, address: "'My data'!A1:C4", fingerprint: "gh" },
      ],
      written: [{ row: 0, column: 0, rows: 1, columns: 1, marks: "AbC7" }],
    },
  ],
};

const reading = (...texts: readonly string[]): Kept =>
  readKept(texts.map((xml, index) => ({ id: `{${index + 1}}`, xml })));

describe("the part that holds what Footing keeps", () => {
  it("gives back what was put in, whatever signs headings hold", () => {
    expect(reading(partText(book))).toEqual({ book, part: "{1}", leftAlone: [] });
  });

  it("is read as it was before comparison sheets were known to it", () => {
    const { comparisons, ...before } = book;
    expect(comparisons).toHaveLength(1);
    expect(reading(partText(before as StoredBook)).book).toEqual({ ...before, comparisons: [] });
  });

  it("may hold signs that no XML knows", () => {
    expect(partText(book)).not.toMatch(/[\u0000-\u0008\uFFFE\uFFFF]|[\uD800-\uDBFF](?![\uDC00-\uDFFF])/);
  });

  it("is read as another program writes it anew", () => {
    const json = /^<[^>]*>([^<]*)</.exec(partText(book))![1]!;
    const respelt = json.replaceAll('"', "&quot;").replaceAll("'", "&#39;").replaceAll("€", "&#x20AC;");
    const root = "f:footing xmlns:f='urn:footing:workbook' version='1'";
    const body = `<?xml version="1.0"?>\n<${root}>${respelt}</f:footing>\n`;
    expect(reading(body).book).toEqual(book);
  });

  it("is left alone where it is newer, broken or not what it should be; the first that can be read is used", () => {
    const newer = partText(book).replace('version="1"', 'version="2"');
    const older = partText(book).replace('version="1"', 'version="0"');
    const broken = partText(book).replace("{", "{{");
    const other = partText({ ...book, setups: [{ ...book.setups[0]!, setup: { ...setup, rows: "rings" as never } }] });
    const kept = reading(newer, older, broken, other, partText(book));
    expect(kept).toMatchObject({ book, part: "{5}" });
    expect(kept.leftAlone.map((problem) => problem.code)).toEqual([
      "stored-by-newer",
      "stored-unreadable",
      "stored-unreadable",
      "stored-unreadable",
    ]);
  });

  it.each([
    ["role", (one: Setup) => ({ ...one, columns: one.columns.map((column) => ({ ...column, role: "king" })) })],
    ["against", (one: Setup) => ({ ...one, columns: one.columns.map((column) => ({ ...column, against: "7" })) })],
    [
      "transform",
      (one: Setup) => ({ ...one, columns: one.columns.map((column) => ({ ...column, transform: { kind: "lag" } })) }),
    ],
    ["level", (one: Setup) => ({ ...one, options: { ...one.options, level: null } })],
    ["columns", (one: Setup) => ({ ...one, columns: {} })],
  ])("is not believed where the %s is not one", (_, spoil) => {
    const spoilt = { ...book, setups: [{ ...book.setups[0]!, setup: spoil(setup) as never }] };
    expect(reading(partText(spoilt)).leftAlone).toEqual([{ code: "stored-unreadable", part: "{1}" }]);
  });
});
