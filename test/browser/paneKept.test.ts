import type { Browser, Page } from "playwright-core";
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { openPane } from "./panePage/openPane.ts";
import { announced, button, focused, getAnswer, heading, openTab, roleOf, storeAs } from "./panePage/steps.ts";
import { launchBrowser } from "./support/browser.ts";

let browser: Browser;
let page: Page;
const faults: string[] = [];

beforeAll(async () => {
  browser = await launchBrowser();
});
afterAll(() => browser.close());

beforeEach(async () => {
  page = await openPane(browser, { width: 320 });
  page.on("pageerror", (fault) => faults.push(fault.message));
});
afterEach(async () => {
  await page.close();
  expect(faults.splice(0)).toEqual([]);
});

const setups = () => page.getByRole("region", { name: "Set-ups in this workbook" });

async function store(name: string): Promise<void> {
  await openTab(page, "Data");
  await storeAs(page, name);
}

describe("stored set-ups", () => {
  it("are stored, opened, renamed and removed by name", async () => {
    await getAnswer(page);
    await store("All drivers");
    expect(await announced(page)).toContain("The set-up All drivers is stored in the workbook.");
    await roleOf(page, "Advertising").selectOption("unused");
    await store("Without advertising");
    await button(page, "Open All drivers").click();
    await setups().getByText("All drivers (open)").waitFor();
    expect(await roleOf(page, "Advertising").inputValue()).toBe("driver");
    expect(await announced(page)).toContain("Opened the set-up All drivers, with 96 rows");
    expect(await focused(page)).toMatch(/^H1 Months!/);
    await openTab(page, "Answer");
    await heading(page, "No answer yet").waitFor();
    await openTab(page, "Data");

    await button(page, "Rename All drivers").click();
    await page.getByLabel("New name of All drivers").fill("Everything");
    await button(page, "Rename it").click();
    await setups().getByText("Everything (open)").waitFor();
    await button(page, "Remove Everything").click();
    await button(page, "Remove it").click();
    await setups().getByText("Everything").waitFor({ state: "detached" });
    expect(await announced(page)).toContain("The set-up Everything is removed from the workbook.");
    expect(await focused(page)).not.toMatch(/^BODY/);
  });

  it("do not take a name that is taken", async () => {
    await getAnswer(page);
    await store("One");
    await store("Two");
    await page.getByLabel("Store this set-up as").fill("one");
    await page.getByText("Another set-up has this name.").waitFor();
  });

  it("name a column whose heading has changed, and let another take its place", async () => {
    await getAnswer(page);
    await store("All drivers");
    await page.evaluate(() => window.stage.host.change(0, 2, "Price level"));
    await button(page, "Open All drivers").click();
    await page.getByText(/There is no column "Price index" in Months/).waitFor();
    await button(page, "Take Price level as driver").click();
    await page.getByText(/There is no column "Price index"/).waitFor({ state: "detached" });
    expect(await roleOf(page, "Price level").inputValue()).toBe("driver");
    expect(await focused(page)).not.toMatch(/^BODY/);
  });

  it("stop an answer that would silently go without a driver", async () => {
    await getAnswer(page);
    await page.evaluate(() => window.stage.host.change(0, 2, "Price level"));
    await button(page, "Answer again").click();
    await page
      .getByRole("alert")
      .getByText(/There is no column "Price index"/)
      .waitFor();
    await openTab(page, "Data");
    await button(page, "Go on without Price index").click();
    await button(page, "Get the answer").click();
    await heading(page, "Repairs explained by Advertising and Rainy days").waitFor();
  });
});

describe("a comparison", () => {
  it("sets drivers in rows and models in columns, says which rows differ, and is written to a sheet", async () => {
    await getAnswer(page);
    await store("All drivers");
    await roleOf(page, "Price index").selectOption("unused");
    await store("Without price");
    await page.getByLabel("Compare All drivers").check();
    await page.getByLabel("Compare Without price").check();
    await button(page, "Compare 2 side by side").click();
    await heading(page, "2 models side by side").waitFor();
    expect(await focused(page)).toBe("H1 2 models side by side");
    expect(await announced(page)).toMatch(/^2 set-ups are compared\. "All drivers" and "Without price" do not rest/);
    const notes = page.getByRole("list", { name: "What can be compared" });
    await notes.getByText(/on the same rows: 2 rows are used by "Without price" alone/).waitFor();
    const drivers = page.getByRole("table", { name: "Drivers of the models" });
    expect(await drivers.getByRole("columnheader").allInnerTexts()).toEqual(["All drivers", "Without price"]);
    expect(await drivers.getByText("not in it").count()).toBe(1);
    expect(await drivers.getByRole("row", { name: /^firm or leaning/ }).count()).toBe(4);
    const whole = page.getByRole("table", { name: "The models as a whole" });
    expect(await whole.getByRole("row", { name: /^Rows used/ }).innerText()).toMatch(/94\s+96/);
    await button(page, "Write the comparison to a sheet").click();
    await expect.poll(() => announced(page)).toBe("The comparison is written to the sheet Comparison.");
    const bar = page.getByRole("contentinfo");
    await bar.getByText(/^Written to Comparison\s*\.$/).waitFor();
    await page.evaluate(() => window.stage.host.change(5, 1, 99));
    await page.getByText("Out of date: cells behind the models have changed.").waitFor();
    await bar.getByText(/^Written to Comparison, out of date\./).waitFor();
    await button(page, "Redo Comparison in place").click();
    await bar.getByText(/^Written to Comparison\s*\.$/).waitFor();
    expect(await page.evaluate(() => window.stage.host.keeper.rewrites.map(({ over }) => over.sheet))).toEqual([
      "Comparison",
    ]);
    await button(page, "Compare again").click();
    await page.getByText("Out of date: cells behind the models have changed.").waitFor({ state: "detached" });
    await button(page, "Back to the answer").click();
    await heading(page, /^Repairs explained by/).waitFor();
  });
});

describe("result sheets", () => {
  const sheets = () => page.getByRole("region", { name: "Result sheets in this workbook" });

  it("are listed with how they stand, and redone in place", async () => {
    await getAnswer(page);
    await page.getByLabel("Live or kept").selectOption("kept");
    await button(page, "Write to the workbook").click();
    await page
      .getByRole("contentinfo")
      .getByText(/^Written to/)
      .waitFor();
    expect(await page.getByLabel("Live or kept").inputValue()).toBe("kept");
    await openTab(page, "Data");
    await sheets().getByText("Kept, and as its cells are.").waitFor();
    await page.evaluate(() => window.stage.host.change(5, 1, 99));
    await sheets().getByText("Out of date: its cells have changed.").waitFor();
    await button(page, "Redo Repairs answer in place").click();
    await sheets().getByText("Kept, and as its cells are.").waitFor();
    expect(await announced(page)).toContain("The sheet Repairs answer is written anew.");
    expect(await page.evaluate(() => window.stage.host.keeper.rewrites.length)).toBe(1);
    expect(await page.evaluate(() => window.stage.host.plans.length)).toBe(1);
  });

  it("say why one is not written over", async () => {
    await getAnswer(page);
    await page.getByLabel("Live or kept").selectOption("kept");
    await button(page, "Write to the workbook").click();
    await openTab(page, "Data");
    await page.evaluate(() => {
      const cells = ["'Repairs answer'!C4"];
      window.stage.host.keeper.rewriteRefusal = { code: "cells-of-others", sheet: "Repairs answer", cells, count: 1 };
    });
    await button(page, "Redo Repairs answer in place").click();
    const alert = page.getByRole("alert");
    await alert.getByText(/holds what Footing did not write/).waitFor();
    await alert.getByRole("button", { name: "'Repairs answer'!C4" }).click();
    expect(await page.evaluate(() => window.stage.host.gone)).toEqual(["'Repairs answer'!C4"]);
  });
});

describe("the first run", () => {
  it("puts sample data on a sheet of their own and reads them", async () => {
    await button(page, "Insert sample data").click();
    await heading(page, "'Sample months'!A4:E100").waitFor();
    expect(await page.evaluate(() => window.stage.host.plans.map(({ name, holds }) => [name, holds]))).toEqual([
      ["Sample months", "data"],
    ]);
    expect(await focused(page)).toMatch(/^H1 'Sample months'/);
  });

  it("says where the workbook may not be changed", async () => {
    await page.evaluate(() => (window.stage.host.refusals.write = { code: "workbook-protected" }));
    await button(page, "Insert sample data").click();
    await page
      .getByRole("alert")
      .getByText(/structure is protected, so no sheet can be added/)
      .waitFor();
    await button(page, "Use selection").waitFor();
  });
});

describe("what a newer Footing keeps", () => {
  it("is left alone, and said", async () => {
    await page.evaluate(() => {
      const { host, pane } = window.stage;
      host.keeper.parts = [{ id: "{1}", xml: '<footing xmlns="urn:footing:workbook" version="9">x</footing>' }];
      pane.commands.open();
    });
    await page.getByText(/a newer Footing stored \(format 9; this one reads format 1\)/).waitFor();
  });
});

describe("hidden rows", () => {
  it("are left out on request alone, and the answer is then written as values", async () => {
    await page.evaluate(() => (window.stage.host.hiddenRows = [3, 4]));
    await getAnswer(page);
    await page.getByText("2 rows of the data are hidden or filtered away, but counted like the others.").waitFor();
    await openTab(page, "Data");
    await page.getByRole("checkbox", { name: /^Visible rows only \(2 rows hidden/ }).check();
    await page.getByText(/^92 rows can be used/).waitFor();
    await button(page, "Get the answer").click();
    await page.getByText(/and left out as if they were not there/).waitFor();
    expect(await page.getByLabel("Live or kept").inputValue()).toBe("kept");
    await page.getByText(/Functions cannot see which rows are hidden/).waitFor();
  });
});
