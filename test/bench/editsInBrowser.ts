import { parseArgs } from "node:util";
import type { CDPSession, Page } from "playwright-core";
import { localAddressOf } from "../../src/core/table/address.ts";
import { randomFrom } from "../support/random.ts";
import { startDeskSuite } from "../browser/support/deskPage.ts";

/**
 * Times edits among 10,000 by 6 cells with 200 formulas over them, on the built desk in a browser, from the edit to new
 * values in all; and tells the memory after each, once garbage is collected: `npm run bench:edits -- --edits 10`.
 */
const { values } = parseArgs({
  options: { edits: { type: "string", default: "10" }, formulas: { type: "string", default: "200" } },
});

const rows = 10_000;
const drivers = ["a", "b", "c", "d", "e"];
const shows = ["ANSWER", "VERDICT", "CHOICE", "COEFFICIENTS", "ERRORS", "PVALUES", "INTERVALS", "COVARIANCE"];
/** Room for the largest result, and results beside one another. */
const room = { rows: 60, columns: 13 } as const;
const besides = 20;

const suite = await startDeskSuite();
const { page, pane } = await suite.openDesk();
await page
  .getByLabel("File to open")
  .setInputFiles({ name: "block.csv", mimeType: "text/csv", buffer: Buffer.from(separatedText()) });
await page.getByText("block", { exact: true }).first().waitFor();
await pane.getByRole("button", { name: "Use selection" }).waitFor();
await atRest(
  page,
  formulas()
    .map(([cell, formula]) => edit(cell, formula))
    .join("\n"),
);
const memory = await page.context().newCDPSession(page);
await memory.send("HeapProfiler.enable");
for (let count = 1; count <= Number(values.edits); count++) {
  const milliseconds = await atRest(page, edit(`block!A${count + 1}`, count));
  const megabytes = await heapOf(memory);
  process.stdout.write(`edit ${count}: ${Math.round(milliseconds)} ms, ${megabytes.toFixed(1)} MB\n`);
}
await suite.close();

function separatedText(): string {
  const random = randomFrom(20_261_201);
  const lines = Array.from({ length: rows }, () => {
    const x = drivers.map(() => random.normal());
    const y = x.reduce((sum, value, index) => sum + (index + 1) * value, 10 + random.normal());
    return [y, ...x].map((value) => value.toFixed(6)).join(",");
  });
  return [["y", ...drivers].join(","), ...lines].join("\n");
}

function formulas(): (readonly [cell: string, formula: string])[] {
  const data = `block!$A$1:$A$${rows + 1},block!$B$1:$F$${rows + 1}`;
  return Array.from({ length: Number(values.formulas) }, (_, index) => {
    const row = Math.floor(index / besides) * room.rows;
    const column = drivers.length + 2 + (index % besides) * room.columns;
    const cell = `block!${localAddressOf({ row, column, rows: 1, columns: 1 })}`;
    return [cell, `=FOOTING.${shows[index % shows.length]!}(${data})`];
  });
}

function edit(cell: string, typed: string | number): string {
  return `desk.edit(${JSON.stringify(cell)}, ${JSON.stringify(typed)});`;
}

/** Works with the desk's hands in the page; answers with the milliseconds until every formula is at rest again. */
function atRest(where: Page, work: string): Promise<number> {
  return where.evaluate(
    `(async () => {
      const { desk } = globalThis;
      await desk.settle();
      const start = performance.now();
      ${work}
      await desk.settle();
      return performance.now() - start;
    })()`,
  );
}

async function heapOf(session: CDPSession): Promise<number> {
  await session.send("HeapProfiler.collectGarbage");
  const { usedSize } = await session.send("Runtime.getHeapUsage");
  return usedSize / 1e6;
}
