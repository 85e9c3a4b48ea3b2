import { readFile } from "node:fs/promises";
import { describe, expect, it } from "vitest";
import type { Download, Page } from "playwright-core";
import { demoBook } from "../../src/desk/demo/demoBook.ts";
import { listedFunctions } from "../../src/functions/listed.ts";
import { openXlsx } from "../../src/desk/files/openXlsx.ts";
import { deskForEachTest } from "./support/deskForEachTest.ts";
import { atSheet } from "./support/deskPage.ts";

const desk = deskForEachTest();

async function saved(page: Page, button: string): Promise<Download> {
  const [download] = await Promise.all([
    page.waitForEvent("download"),
    page.getByRole("button", { name: button }).click(),
  ]);
  return download;
}

const bytesOf = async (download: Download): Promise<Uint8Array> =>
  new Uint8Array(await readFile(await download.path()));

describe("the desk", { timeout: 180_000 }, () => {
  it("opens with the demo workbook and the pane beside it", async () => {
    const { page } = desk;
    for (const { name } of demoBook().sheets) await page.getByText(name, { exact: true }).first().waitFor();
    expect(await atSheet(page, (d) => d.values("Months!A4:C5"))).toEqual([
      ["Month", "Repairs", "Price index"],
      [42370, expect.any(Number), expect.any(Number)],
    ]);
  });

  it("computes a formula of the grid and one of the add-in, and again when a cell changes", async () => {
    const { page } = desk;
    await atSheet(page, (d) => d.edit("Parts!H5", "=AVERAGE(B5:B64)"));
    await atSheet(page, (d) => d.edit("Parts!H6", "=FOOTING.COEFFICIENTS(B4:B64,C4:D64)"));
    const before = await atSheet(page, (d) => [d.value("Parts!H5"), ...d.values("Parts!H6:H8").flat()]);
    expect(before.every((value) => typeof value === "number")).toBe(true);
    await atSheet(page, (d) => d.edit("Parts!B5", 99));
    const after = await atSheet(page, (d) => [d.value("Parts!H5"), ...d.values("Parts!H6:H8").flat()]);
    after.forEach((value, index) => expect(value).not.toBe(before[index]));
  });

  it("calculates the formulas that were opened without a value", async () => {
    const { page } = desk;
    const cells = await atSheet(page, (d) => d.values("Functions!A1:C120"));
    const error = await atSheet(page, (d) => d.error("Functions!B5"));
    expect(error).toBeNull();
    const samples = cells.flatMap(([name], row) =>
      /^[A-Z]+$/.test(String(name)) ? [[name, cells[row + 1]?.[1]] as const] : [],
    );
    expect(samples.length).toBeGreaterThan(10);
    for (const [name, value] of samples) expect(value, String(name)).not.toBe("");
  });

  it("lists every worksheet function in the pane", async () => {
    await desk.pane.getByRole("button", { name: "Functions in the sheet in front" }).click();
    await desk.pane.getByRole("button", { name: "The worksheet functions" }).click();
    const calls = await desk.pane.getByText(/^=FOOTING\./).allTextContents();
    expect(calls).toEqual(listedFunctions.map(({ call }) => call));
  });

  it("saves the workbook, opens it again and finds the same", async () => {
    const { page } = desk;
    await atSheet(page, (d) => d.edit("Parts!H5", "=SUM(B5:B6)"));
    const download = await saved(page, "Save for Excel");
    expect(download.suggestedFilename()).toBe("Kestrel & Vane.xlsx");
    const reading = await openXlsx(await bytesOf(download));
    const expected = await atSheet(page, (d) => d.values("Parts!A1:H64"));
    await page.getByLabel("File to open").setInputFiles(await download.path());
    await desk.pane.getByRole("button", { name: "Use selection" }).waitFor();
    expect(reading.ok && reading.value.sheets.map(({ name }) => name)).toEqual(
      demoBook().sheets.map(({ name }) => name),
    );
    expect(await atSheet(page, (d) => d.values("Parts!A1:H64"))).toEqual(expected);
    expect(await atSheet(page, (d) => d.formula("Parts!H5"))).toBe("=SUM(B5:B6)");
  });

  it("saves the workbook for LibreOffice, says what that means, and opens it again with every result", async () => {
    const { page } = desk;
    await atSheet(page, () => undefined);
    const before = await atSheet(page, (d) => d.snapshot().sheets.map(({ rows }) => rows));
    const download = await saved(page, "Save for LibreOffice");
    expect(download.suggestedFilename()).toBe("Kestrel & Vane for LibreOffice.xlsx");
    const said = await page.getByRole("status").textContent();
    expect(said).toMatch(
      /^Saved for LibreOffice: every figure shows there as it is now\. LibreOffice cannot calculate/,
    );
    const file = { name: "Ours for LibreOffice.xlsx", mimeType: "", buffer: Buffer.from(await bytesOf(download)) };
    await page.getByLabel("File to open").setInputFiles(file);
    await desk.pane.getByRole("button", { name: "Use selection" }).waitFor();
    await page.getByRole("heading", { name: "The desk Ours", exact: true }).waitFor();
    expect(await page.getByRole("status").textContent()).toBe("");
    expect(await atSheet(page, (d) => d.snapshot().sheets.map(({ rows }) => rows))).toEqual(before);
  });

  it("says of a workbook from LibreOffice where something was changed within a result", async () => {
    const { page } = desk;
    const changed = await readFile(new URL("../reference/workbooks/tubes-changed.xlsx", import.meta.url));
    await page.getByLabel("File to open").setInputFiles({ name: "tubes.xlsx", mimeType: "", buffer: changed });
    await page.getByText("something was changed within 'Rye''s tubes'!A5:D8. What was put there stays").waitFor();
    expect(await atSheet(page, (d) => [d.value("'Rye''s tubes'!C5"), d.value("'Rye''s tubes'!A7")])).toEqual([
      7.5,
      "mine",
    ]);
  });

  it("saves the sheet in front as separated text and opens such text", async () => {
    const { page } = desk;
    await page.getByText("Weeks", { exact: true }).first().click();
    const download = await saved(page, "Save sheet as CSV");
    expect(download.suggestedFilename()).toBe("Weeks.csv");
    const text = new TextDecoder().decode(await bytesOf(download));
    expect(text).toMatch(/^\uFEFF?Week from,Courier cost,Parcels,Fuel\r\n2021-01-04,/);
    const file = { name: "weeks of ours.csv", mimeType: "text/csv", buffer: Buffer.from(text) };
    await page.getByLabel("File to open").setInputFiles(file);
    await desk.pane.getByRole("button", { name: "Use selection" }).waitFor();
    expect(await atSheet(page, (d) => d.value("'weeks of ours'!A2"))).toBe(44_200);
  });

  it("says why a file cannot be read, and leaves the workbook as it was", async () => {
    const { page } = desk;
    const file = { name: "notes.xlsx", mimeType: "", buffer: Buffer.from("just notes") };
    await page.getByLabel("File to open").setInputFiles(file);
    await page.getByText("notes.xlsx cannot be read: it is no Excel workbook (.xlsx).").waitFor();
    expect(await atSheet(page, (d) => d.value("Months!B4"))).toBe("Repairs");
  });
});

describe("by keyboard", { timeout: 180_000 }, () => {
  /** The elements of the page's parts. */
  const parts = { bar: "header", sheet: "main", pane: "iframe" };
  const focusIn = (page: Page, part: keyof typeof parts): Promise<unknown> =>
    page.waitForFunction((one) => document.querySelector(one)?.contains(document.activeElement), parts[part]);

  it("F6 goes round bar, sheet and pane, and back with Shift", async () => {
    const { page } = desk;
    await page.getByRole("button", { name: "Open..." }).focus();
    const ways = [
      ["F6", "sheet"],
      ["F6", "pane"],
      ["F6", "bar"],
      ["Shift+F6", "pane"],
      ["Shift+F6", "sheet"],
    ] as const;
    for (const [key, part] of ways) {
      await page.keyboard.press(key);
      await focusIn(page, part);
    }
  });

  it("a cell is typed into after F6", async () => {
    const { page } = desk;
    await atSheet(page, (d) => d.select("Handover!F3"));
    await page.getByRole("button", { name: "Open..." }).focus();
    await page.keyboard.press("F6");
    await focusIn(page, "sheet");
    await page.keyboard.type("1.5");
    await page.keyboard.press("Enter");
    expect(await atSheet(page, (d) => d.value("Handover!F3"))).toBe(1.5);
  });

  it("the pane is made wider and narrower with the arrow keys", async () => {
    const edge = desk.page.getByRole("separator", { name: "Width of the pane" });
    const before = Number(await edge.getAttribute("aria-valuenow"));
    await edge.focus();
    await desk.page.keyboard.press("ArrowLeft");
    expect(Number(await edge.getAttribute("aria-valuenow"))).toBeGreaterThan(before);
    for (let i = 0; i < 40; i++) await desk.page.keyboard.press("ArrowRight");
    expect(Number(await edge.getAttribute("aria-valuenow"))).toBe(320);
  });

  it("has the pane below the cells where there is no room beside them", async () => {
    const { page, pane } = desk;
    await page.setViewportSize({ width: 320, height: 700 });
    const [cells, frame] = await Promise.all([
      page.getByRole("main").boundingBox(),
      page.locator("iframe[title='Footing']").boundingBox(),
    ]);
    expect(cells!.y + cells!.height).toBeLessThanOrEqual(frame!.y);
    expect([cells!.width, frame!.width]).toEqual([320, 320]);
    expect(await page.evaluate("document.documentElement.scrollWidth")).toBe(320);
    await pane.getByRole("button", { name: "Use selection" }).click({ trial: true });
  });
});
