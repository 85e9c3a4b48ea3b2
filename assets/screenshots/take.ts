/* Takes the pictures of the README from the built desk: npm run build && tsx assets/screenshots/take.ts */
import { fileURLToPath } from "node:url";
import { atSheet, startDeskSuite, type DeskPage } from "../../test/browser/support/deskPage.ts";

const into = (name: string): string => fileURLToPath(new URL(name, import.meta.url));
/** In pixels, each drawn half as fine again. */
const viewport = { width: 1360, height: 850 };

async function answer({ page, pane }: DeskPage): Promise<void> {
  await atSheet(page, (desk) => desk.select("Months!A4:E100"));
  await pane.getByRole("button", { name: "Use selection" }).click();
  await pane.getByRole("button", { name: "Get the answer" }).click();
  await pane.getByRole("button", { name: "Write to the workbook" }).waitFor();
}

async function writeSheet({ page, pane }: DeskPage): Promise<void> {
  await pane.getByRole("button", { name: "Write to the workbook" }).click();
  await pane
    .getByText(/^Written to/)
    .first()
    .waitFor();
  await atSheet(page, (desk) => desk.select("'Repairs answer'!A1"));
}

async function review({ page, pane }: DeskPage): Promise<void> {
  await atSheet(page, (desk) => desk.select("Handover!A4"));
  await pane.getByRole("tab", { name: "Review" }).click();
  await pane.getByRole("button", { name: "List the regressions in this workbook" }).click();
  await pane.getByRole("button", { name: "Write to a review sheet" }).waitFor();
}

const suite = await startDeskSuite();
const desk = await suite.openDesk({ viewport, deviceScaleFactor: 1.5 });
await answer(desk);
await desk.page.screenshot({ path: into("desk-answer.png") });
await writeSheet(desk);
await desk.page.screenshot({ path: into("result-sheet.png") });
await desk.close();
const handover = await suite.openDesk({ viewport, deviceScaleFactor: 1.5 });
await review(handover);
await handover.page.screenshot({ path: into("desk-review.png") });
await handover.close();
await suite.close();
