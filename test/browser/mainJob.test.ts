import { readFile } from "node:fs/promises";
import type { Page } from "playwright-core";
import { describe, expect, it } from "vitest";
import type { SheetData } from "../../src/desk/book/bookData.ts";
import { openXlsx } from "../../src/desk/files/openXlsx.ts";
import { deskForEachTest } from "./support/deskForEachTest.ts";
import { atSheet } from "./support/deskPage.ts";

const desk = deskForEachTest();

/** Every number on the printed part of the result sheet, by cell. */
const numbersOn = (page: Page): Promise<Readonly<Record<string, number>>> =>
  atSheet(page, (d) => {
    const found: Record<string, number> = {};
    d.values("'Repairs answer'!A1:K120").forEach((row, r) =>
      row.forEach((value, c) => {
        if (typeof value === "number") found[`${r},${c}`] = value;
      }),
    );
    return found;
  });

async function savedSheet(page: Page): Promise<{ readonly path: string; readonly sheet: SheetData }> {
  const [download] = await Promise.all([
    page.waitForEvent("download"),
    page.getByRole("button", { name: "Save for Excel" }).click(),
  ]);
  const path = await download.path();
  const reading = await openXlsx(new Uint8Array(await readFile(path)));
  if (!reading.ok) throw new Error(reading.because);
  return { path, sheet: reading.value.sheets.find(({ name }) => name === "Repairs answer")! };
}

describe("from cells to a result sheet", { timeout: 180_000 }, () => {
  it("by mouse: the sheet follows the cells, and a saved copy opens with the same numbers", async () => {
    const { page, pane } = desk;
    await atSheet(page, (d) => d.select("Months!A4:E100"));
    await pane.getByRole("button", { name: "Use selection" }).click();
    await pane.getByRole("button", { name: "Get the answer" }).click();
    await pane.getByRole("button", { name: "Write to the workbook" }).click();
    await pane.getByText("Written to the sheet").waitFor({ state: "attached" });
    const before = await numbersOn(page);
    expect(Object.keys(before).length).toBeGreaterThan(50);
    await page.getByRole("img", { name: "Chart: Residuals over fitted values" }).waitFor({ state: "attached" });

    await atSheet(page, (d) => d.edit("Months!B50", 700));
    const after = await numbersOn(page);
    const moved = Object.keys(before).filter((cell) => before[cell] !== after[cell]);
    expect(moved.length).toBeGreaterThan(40);

    const { path, sheet } = await savedSheet(page);
    expect(sheet.charts).toHaveLength(3);
    await page.getByLabel("File to open").setInputFiles(path);
    await pane.getByRole("button", { name: "Use selection" }).waitFor();
    expect(await numbersOn(page)).toEqual(after);
    await atSheet(page, (d) => d.edit("Months!B50", 430));
    expect(await numbersOn(page)).not.toEqual(after);
  });

  it("the charts stand over the cells that the page keeps for them, and hide none of its text", async () => {
    const { page, pane } = desk;
    await page.setViewportSize({ width: 2600, height: 1000 });
    await pane.getByLabel("Or type an address").fill("Months!A4:E100");
    await pane.getByRole("button", { name: "Read it" }).click();
    await pane.getByRole("button", { name: "Get the answer" }).click();
    await pane.getByRole("button", { name: "Write to the workbook" }).click();
    const chart = page.getByRole("img", { name: "Chart: Residuals over fitted values" });
    await chart.waitFor();
    const { corner, hidden } = await atSheet(page, (d) => {
      const { charts } = d.snapshot().sheets.find(({ name }) => name === "Repairs answer")!;
      const { place } = charts.find(({ title }) => title === "Residuals over fitted values")!;
      const rows = `${place.row + 1}:K${place.row + place.rows}`;
      const covered = d.values(`'Repairs answer'!A${rows}`).flat();
      const sheet = d.book.grid.api.getActiveWorkbook()!.getActiveSheet();
      const first = `${String.fromCharCode(65 + place.column)}${place.row + 1}`;
      const { x, y } = (sheet.getRange(first) as unknown as { getCellRect: () => DOMRect }).getCellRect();
      return { corner: { x, y }, hidden: covered.filter((value) => value !== "") };
    });
    expect(hidden).toEqual([]);
    const cells = (await page.locator("main canvas").last().boundingBox())!;
    const drawn = (await chart.boundingBox())!;
    expect(Math.abs(drawn.x - cells.x - corner.x)).toBeLessThan(edge);
    expect(Math.abs(drawn.y - cells.y - corner.y)).toBeLessThan(edge);
  });

  it("by keyboard alone", async () => {
    const { page, pane } = desk;
    await page.getByRole("button", { name: "To the pane" }).focus();
    await page.keyboard.press("Enter");
    await tabTo(page, "Or type an address");
    await page.keyboard.type("Months!A4:E100");
    await page.keyboard.press("Enter");
    await pane.getByRole("button", { name: "Get the answer" }).waitFor();
    await tabTo(page, "Get the answer");
    await page.keyboard.press("Enter");
    await pane.getByRole("button", { name: "Write to the workbook" }).waitFor();
    await tabTo(page, "Write to the workbook");
    await page.keyboard.press("Enter");
    await pane.getByText("Written to the sheet").waitFor({ state: "attached" });
    const before = await numbersOn(page);

    await atSheet(page, (d) => d.select("Months!B50"));
    for (const part of ["header", "main"]) {
      await page.keyboard.press("F6");
      await page.waitForFunction((wanted) => document.querySelector(wanted)?.contains(document.activeElement), part);
    }
    await page.keyboard.type("700");
    await page.keyboard.press("Enter");
    expect(await atSheet(page, (d) => d.value("Months!B50"))).toBe(700);
    expect(await numbersOn(page)).not.toEqual(before);
  });
});

/** In pixels: the grid frames what floats over it. The headers, which a wrong place is off by, are 20 and 46. */
const edge = 8;

const mostStops = 60;

/** Tabs on in the pane until the control of that name has the focus. */
async function tabTo(page: Page, name: string): Promise<void> {
  const pane = page.frames().find((frame) => frame.url().includes("taskpane.html"))!;
  for (let stop = 0; stop < mostStops; stop++) {
    const reached = await pane.evaluate((wanted) => {
      const focused = document.activeElement;
      const labels =
        focused instanceof HTMLInputElement ? [...(focused.labels ?? [])].map((label) => label.textContent) : [];
      return [focused?.textContent, focused?.getAttribute("aria-label"), ...labels].some(
        (text) => text?.trim() === wanted,
      );
    }, name);
    if (reached) return;
    await page.keyboard.press("Tab");
  }
  throw new Error(`"${name}" is not reached with the Tab key.`);
}
