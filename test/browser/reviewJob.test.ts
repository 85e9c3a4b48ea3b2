import { readFile } from "node:fs/promises";
import type { Page } from "playwright-core";
import { describe, expect, it } from "vitest";
import type { SheetData } from "../../src/desk/book/bookData.ts";
import { openXlsx } from "../../src/desk/files/openXlsx.ts";
import { deskForEachTest } from "./support/deskForEachTest.ts";
import { atSheet } from "./support/deskPage.ts";

const desk = deskForEachTest();

async function savedSheets(page: Page): Promise<readonly SheetData[]> {
  const [download] = await Promise.all([
    page.waitForEvent("download"),
    page.getByRole("button", { name: "Save for Excel" }).click(),
  ]);
  const reading = await openXlsx(new Uint8Array(await readFile(await download.path())));
  if (!reading.ok) throw new Error(reading.because);
  return reading.value.sheets;
}

const textsOn = (page: Page, sheet: string): Promise<readonly string[]> =>
  page.evaluate(
    `(async () => {
      await globalThis.desk.settle();
      return globalThis.desk.values(${JSON.stringify(`'${sheet}'!A1:F120`)}).flat().map(String);
    })()`,
  );

const sheetInFront = (page: Page): Promise<string> =>
  atSheet(page, (d) => d.book.grid.api.getActiveWorkbook()!.getActiveSheet().getSheetName());

describe("a regression that was handed over", { timeout: 180_000 }, () => {
  it("is found in the workbook, explained, written up and saved", async () => {
    const { page, pane } = desk;
    await pane.getByRole("tab", { name: "Review" }).click();
    await pane.getByRole("button", { name: "List the regressions in this workbook" }).click();
    await pane.getByText("The last row (Months!B100:E100) was left off.").first().waitFor();
    const verdict = await pane.getByRole("region", { name: "Verdict on the work" }).innerText();
    expect(verdict).toContain("the conclusion on Price index does not hold as reported");
    await pane
      .getByText("The reported standard errors are classical. The evidence does not allow them")
      .first()
      .waitFor();
    const table = await pane.getByRole("table", { name: "Reported and recomputed" }).innerText();
    expect(table.replaceAll(/\s+/g, " ")).toContain("coefficient of Price index B6 differs -1.233 -1.234 -1.233");

    await pane.getByRole("button", { name: "Months!B100:E100", exact: true }).first().click();
    await pane.getByText("Months!B100:E100 is selected in the sheet.").waitFor({ state: "attached" });
    expect(await sheetInFront(page)).toBe("Months");

    await pane.getByRole("button", { name: "Write to a review sheet" }).click();
    await pane.getByRole("button", { name: "Repairs review" }).waitFor();
    const texts = await textsOn(page, "Repairs review");
    for (const words of [verdict.replaceAll("\u00a0", " "), "Changes the conclusion", "Sign-off", "Signature"]) {
      expect(texts).toContain(words);
    }
    const saved = (await savedSheets(page)).find(({ name }) => name === "Repairs review");
    expect(JSON.stringify(saved?.rows)).toContain("The last row (Months!B100:E100) was left off.");
  });

  it("is reviewed where its cells are selected, is out of date when they change, and leads to an answer", async () => {
    const { page, pane } = desk;
    await atSheet(page, (d) => d.select("Handover!A4:D11"));
    await pane.getByRole("tab", { name: "Review" }).click();
    await pane.getByRole("button", { name: "Review the selected cells" }).click();
    await pane.getByText("The last row (Months!B100:E100) was left off.").first().waitFor();

    await atSheet(page, (d) => d.edit("Months!B50", 700));
    await pane.getByText("has changed since this review").waitFor();
    await atSheet(page, (d) => d.edit("Months!B50", 430));

    await pane.getByRole("button", { name: "Open the data and answer it yourself" }).click();
    await pane.getByRole("button", { name: "Get the answer" }).click();
    await pane.getByRole("heading", { name: "Repairs explained by Price index, Advertising and Rainy days" }).waitFor();
  });
});

describe("where a page may not start workers", { timeout: 180_000 }, () => {
  it("the same code is loaded for the page itself, and reviews", async () => {
    const { page, pane } = desk;
    const frame = page.frames().find((one) => one.url().includes("taskpane.html"))!;
    await frame.evaluate(() => {
      const forbidden = function (): never {
        throw new Error("not allowed here");
      };
      Object.assign(globalThis, { Worker: forbidden });
    });
    const loaded = page.waitForRequest(/\/inline\.js$/);
    await pane.getByRole("tab", { name: "Review" }).click();
    await pane.getByRole("button", { name: "List the regressions in this workbook" }).click();
    await loaded;
    await pane.getByText("The last row (Months!B100:E100) was left off.").first().waitFor();
  });
});
