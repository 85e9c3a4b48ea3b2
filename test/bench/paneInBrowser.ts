import { parseArgs } from "node:util";
import { startDeskSuite } from "../browser/support/deskPage.ts";
import { largeDrivers, largeFile } from "../browser/support/largeFile.ts";
import { watchTasks } from "./longTasks.ts";

/**
 * Times the pane over a large sheet of six drivers, on the built desk in a browser: reading, and from the click to the
 * verdict, each with the longest task on the pane's main thread: `npm run bench:pane -- --rows 100000`.
 */
const { values } = parseArgs({
  options: { rows: { type: "string", default: "100000" }, rounds: { type: "string", default: "5" } },
});
const rows = Number(values.rows);
const counted = `${rows.toLocaleString("en")} rows`;
/** The pane is loaded anew with the file; only then does it stand still. */
const settlingMilliseconds = 3_000;
/** A large file takes its time to open on the desk, which is not measured. */
const patience = { timeout: 400_000 };

const suite = await startDeskSuite();
const file = { name: "trips.csv", mimeType: "text/csv", buffer: largeFile(rows) };
for (let round = 1; round <= Number(values.rounds); round++) {
  const { page, pane, close } = await suite.openDesk();
  await page.getByLabel("File to open").setInputFiles(file);
  await page.getByText("trips", { exact: true }).first().waitFor(patience);
  await page.waitForTimeout(settlingMilliseconds);
  const watch = await watchTasks(page);
  const reading = await timed(async () => {
    await pane.getByLabel("Or type an address").fill(`trips!A1:${"ABCDEFG"[largeDrivers.length]!}${rows + 1}`);
    await pane.getByRole("button", { name: "Read it" }).click();
    await pane.getByText(counted).first().waitFor(patience);
  });
  const whileReading = await watch.longest();
  const answering = await timed(async () => {
    await pane.getByRole("button", { name: "Get the answer" }).click();
    await pane.getByRole("heading", { name: /^Cost explained by/ }).waitFor(patience);
  });
  const whileAnswering = await watch.longest();
  process.stdout.write(
    `${counted}: read in ${reading} ms (longest task ${whileReading} ms), ` +
      `verdict ${answering} ms after the click (longest task ${whileAnswering} ms)\n`,
  );
  await close();
}
await suite.close();

async function timed(work: () => Promise<void>): Promise<number> {
  const start = performance.now();
  await work();
  return Math.round(performance.now() - start);
}
