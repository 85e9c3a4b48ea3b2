import type { Browser, Page } from "playwright-core";
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from "vitest";
import { openPane } from "./panePage/openPane.ts";
import {
  allowTextNumbers,
  announced,
  button,
  focused,
  getAnswer,
  heading,
  openTab,
  roleOf,
  useSelection,
} from "./panePage/steps.ts";
import { launchBrowser } from "./support/browser.ts";

let browser: Browser;
let page: Page;
const faults: string[] = [];

beforeAll(async () => {
  browser = await launchBrowser();
});
afterAll(() => browser.close());

beforeEach(async () => {
  page = await openPane(browser, { width: 350 });
  page.on("pageerror", (fault) => faults.push(fault.message));
  page.on("console", (message) => {
    if (message.type() === "error") faults.push(message.text());
  });
});
afterEach(async () => {
  await page.close();
  expect(faults.splice(0)).toEqual([]);
});

describe("choosing data", () => {
  it("says what it does and offers the selection first", async () => {
    await heading(page, "What holds, and how firmly?").waitFor();
    expect(await page.getByText(/Nothing is sent anywhere/).isVisible()).toBe(true);
    await useSelection(page);
    expect(await announced(page)).toBe("Read 96 rows and 6 columns from Months!A1:F97.");
    expect(await focused(page)).toBe("H1 Months!A1:F97");
  });

  it("takes a named range from the list", async () => {
    await page.getByLabel("Table, named range or sheet").selectOption({ label: "First_years" });
    await button(page, "Use it").click();
    await heading(page, "Months!A1:F97").waitFor();
  });

  it("takes a typed address", async () => {
    await page.getByLabel("Or type an address").fill("Months!A1:F49");
    await page.keyboard.press("Enter");
    await heading(page, "Months!A1:F49").waitFor();
  });

  it("guesses roles and says so, until they are chosen", async () => {
    await useSelection(page);
    expect(await roleOf(page, "Repairs").inputValue()).toBe("outcome");
    expect(await roleOf(page, "Month").inputValue()).toBe("time");
    expect(await page.getByText("a guess", { exact: true }).count()).toBe(6);
    await roleOf(page, "Advertising").selectOption("outcome");
    expect(await roleOf(page, "Repairs").inputValue()).toBe("driver");
    expect(await page.getByText("a guess", { exact: true }).count()).toBe(4);
  });

  it("tells what a column holds, and jumps to the cells that cannot be used", async () => {
    await useSelection(page);
    await button(page, /^Price index/).click();
    await button(page, "C31").click();
    expect(await page.evaluate(() => window.stage.host.gone)).toEqual(["Months!C31"]);
    expect(await announced(page)).toBe("Months!C31 is selected in the sheet.");
    expect(await page.getByRole("img", { name: /^Price index, values from/ }).isVisible()).toBe(true);
  });

  it("shows what is in the way and mends it in one click", async () => {
    await useSelection(page);
    await page.getByText(/Months!D15 and Months!D21 in column "Advertising"/).waitFor();
    await allowTextNumbers(page);
    await page.getByText(/monthly from January 2018 to December 2025, 2 gaps: June 2020, July 2020/).waitFor();
    await button(page, "2 rows left out").click();
    await button(page, "C32").click();
    expect(await page.evaluate(() => window.stage.host.gone)).toEqual(["Months!C32"]);
  });

  it("says what rows are, and what is missing for it", async () => {
    await useSelection(page);
    await page.getByRole("radio", { name: "in groups" }).check();
    await page.getByText(/Give one column the role group/).waitFor();
    await roleOf(page, "Shop").selectOption("group");
    await page.getByText(/Rows with the same Shop belong together, in the order of Month/).waitFor();
  });
});

describe("the answer", () => {
  it("is two actions away from sensible data, the verdict first", async () => {
    await page.evaluate(() => {
      window.stage.host.rows = window.stage.host.rows.map((row, index) =>
        row.map((cell, column) => (index > 0 && column === 3 ? 20 + (index % 7) : cell)),
      );
    });
    await button(page, "Use selection").click();
    await button(page, "Get the answer").click();
    const verdict = page.getByRole("region", { name: "Verdict" });
    await verdict.waitFor();
    expect(await verdict.getByRole("listitem").count()).toBe(3);
    expect(await focused(page)).toMatch(/^H1 Repairs explained by Price index, Advertising and Rainy days/);
    expect(await announced(page)).toMatch(/^The answer is ready\./);
  });

  it("marks the case in force in words and gives the p-values that put it there", async () => {
    await getAnswer(page);
    const cases = page.getByRole("table", { name: /The four cases/ });
    expect(await cases.getByRole("cell", { name: /in force/ }).count()).toBe(1);
    expect(await cases.getByRole("cell", { name: /in force/ }).innerText()).toContain("Newey-West");
    expect(await page.getByRole("definition").allInnerTexts()).toEqual([
      expect.stringMatching(/^even: White's test, p\s=\s0\.\d+, tested at 10\s%$/),
      expect.stringMatching(/^some: Breusch-Godfrey test, p\sunder\s0.0001, tested at 10\s%$/),
    ]);
  });

  it("draws three intervals a driver, with their words, and the figures behind", async () => {
    await getAnswer(page);
    const rain = page.getByRole("article", { name: "Rainy days" });
    const words = await rain.getByRole("img").getAttribute("aria-label");
    expect(words).toMatch(
      /^95 % intervals of Rainy days: classical from .* White from .* Newey-West \(in force\) from/,
    );
    await rain.getByRole("button", { name: /Figures/ }).click();
    const table = page.getByRole("table", { name: "Figures of Rainy days" });
    expect(await table.getByRole("row").count()).toBe(7);
    await rain.getByText(/^Ratios are held against a distribution: classical/).waitFor();
    await rain.getByText(/Over all \d+ choices of standard errors and distribution, p/).waitFor();
    expect(await table.getByRole("columnheader").allInnerTexts()).toEqual(["classical", "White", "Newey-West\u00a0●"]);
  });

  it("is found again when the policy changes, and keeps the reason of a fixed kind", async () => {
    await getAnswer(page);
    await button(page, /Change how they are chosen/).click();
    await page.getByLabel("Policy").selectOption({ label: "textbook: as handbooks teach it" });
    await page
      .getByText(/tested at 5\s%/)
      .first()
      .waitFor();
    await page.getByLabel("Standard errors").selectOption({ label: "always White" });
    await page.getByLabel("Reason, which the report keeps").fill("the board asked for it");
    await button(page, "Fix this kind").click();
    await page
      .getByText(/fixed by hand \(reason: the board asked for it\)/)
      .first()
      .waitFor();
    const cases = page.getByRole("table", { name: /The four cases/ });
    expect(await cases.getByRole("cell", { name: /in force/ }).innerText()).toContain("White");
    expect(await cases.getByRole("cell", { name: /the tests point here/ }).innerText()).toContain("Newey-West");
  });

  it("can be copied as text for a memo", async () => {
    await getAnswer(page);
    await button(page, "Copy as text for a memo").click();
    const field = page.getByRole("textbox", { name: "The answer as text" });
    await field.waitFor();
    const text = await field.inputValue();
    expect(text).toMatch(/^Repairs explained by [\s\S]*WHAT HOLDS[\s\S]*DRIVERS[\s\S]*SHA-256[\s\S]*not financial/);
    await page.context().grantPermissions(["clipboard-read", "clipboard-write"]);
    await button(page, "Copy as text").last().click();
    await page.getByText("Copied.").waitFor();
    expect(await page.evaluate(() => navigator.clipboard.readText())).toBe(text);
  });

  it("is written to the workbook, live or kept, with a way there", async () => {
    await getAnswer(page);
    await page.getByLabel("Live or kept").selectOption("kept");
    await button(page, "Write to the workbook").click();
    await button(page, "Repairs answer").click();
    expect(await page.evaluate(() => window.stage.host.gone)).toEqual(["'Repairs answer'!A1"]);
    expect(await page.evaluate(() => window.stage.host.plans.length)).toBe(1);
  });

  it("says when it is out of date, and is redone with its kept sheet", async () => {
    await getAnswer(page);
    await page.getByLabel("Live or kept").selectOption("kept");
    await button(page, "Write to the workbook").click();
    await button(page, "Repairs answer").waitFor();
    await page.evaluate(() => window.stage.host.change(5, 1, 99));
    await page.getByText(/Out of date/).waitFor();
    expect(await announced(page)).toBe("Months!B6 has changed. The answer is out of date.");
    await button(page, "Redo answer and sheet").click();
    await page.getByText(/Out of date/).waitFor({ state: "detached" });
    // In its own place: no second sheet.
    expect(await page.evaluate(() => window.stage.host.plans.length)).toBe(1);
    expect(await page.evaluate(() => window.stage.host.keeper.rewrites.length)).toBe(1);
  });

  it("names what is missing where there is none yet", async () => {
    await openTab(page, "Answer");
    await heading(page, "No answer yet").waitFor();
    await button(page, "Choose the data").click();
    await heading(page, "What holds, and how firmly?").waitFor();
  });
});

describe("the functions of the sheet in front", () => {
  const openTools = (): Promise<void> => button(page, "Functions in the sheet in front").click();

  it("are recalculated, and that is said and shown", async () => {
    await openTools();
    await button(page, "Recalculate this sheet's functions").click();
    const tools = page.getByRole("region", { name: "Functions in the sheet" });
    await tools.getByText("The functions on the sheet Months are being calculated again.").waitFor();
    expect(await announced(page)).toBe("The functions on the sheet Months are being calculated again.");
  });

  it("give way to values: the live sheet just written is then a kept one", async () => {
    await getAnswer(page);
    await button(page, "Write to the workbook").click();
    await page
      .getByText("Written to")
      .getByText(/, live\./)
      .waitFor();
    await openTools();
    await button(page, "Turn into a kept sheet").click();
    await page
      .getByText("Written to")
      .getByText(/, kept\./)
      .waitFor();
    expect(await announced(page)).toBe("The sheet Repairs answer is kept now: it holds values that stay.");
  });

  it("stay where values are missing; the cells are named and jump", async () => {
    await page.evaluate(() => {
      window.stage.host.refusals.keep = {
        code: "values-missing",
        cells: ["Answer!B9"],
        values: ["#BUSY!"],
        count: 1,
      };
    });
    await openTools();
    await button(page, "Turn into a kept sheet").click();
    const alert = page.getByRole("alert");
    await alert.getByText(/Cell Answer!B9 shows "#BUSY!" in place of a value/).waitFor();
    await alert.getByRole("button", { name: "Answer!B9" }).click();
    expect(await page.evaluate(() => window.stage.host.gone)).toEqual(["Answer!B9"]);
  });

  it("are explained where they show a sign in place of a value", async () => {
    await openTools();
    await button(page, "What #NAME?, #BUSY! and #SPILL! mean").click();
    expect(await page.getByRole("term").allInnerTexts()).toEqual(["#NAME?", "#BUSY!", "#SPILL!"]);
    expect(await page.getByRole("definition").count()).toBe(3);
  });
});

describe("evidence", () => {
  it("gives every test with its question, reading and source", async () => {
    await getAnswer(page);
    await openTab(page, "Evidence");
    await page.getByText(/^Tests are held to 10\s%: something counts as found where p is below 0\.1\./).waitFor();
    await heading(page, "Does the spread of the errors change with the drivers?").waitFor();
    await page.getByText(/Breusch and Pagan 1979, in the form of Koenker 1981\. It decided/).waitFor();
    const orders = page.getByRole("table", { name: "Breusch-Godfrey test by order" });
    expect(await orders.getByRole("rowheader").allInnerTexts()).toContain("12");
    expect(await orders.getByRole("columnheader").count()).toBe(5);
    const correlations = page.getByRole("table", { name: "Ljung-Box test by order" });
    expect(await correlations.getByRole("columnheader").allInnerTexts()).toEqual(["order", "statistic", "p-value"]);
  });

  it("is within reach of a verdict that guards have something to add to", async () => {
    await getAnswer(page);
    await page.getByText(/^Worth knowing: .*time\. See the guards$/).waitFor();
    await button(page, "See the guards").click();
    await heading(page, "Evidence on Repairs").waitFor();
    expect(await focused(page)).toBe("H1 Evidence on Repairs");
  });

  it("guards against what the tests do not ask, and jumps to the rows that weigh most", async () => {
    await getAnswer(page);
    await openTab(page, "Evidence");
    await heading(page, /^Drivers that move together (nothing found|worth knowing|look into it)$/).waitFor();
    const weighty = page.getByRole("listitem").filter({ hasText: /Cook's distance/ });
    expect(await weighty.count()).toBe(5);
    await weighty.first().getByRole("button").click();
    expect(await page.evaluate(() => window.stage.host.gone[0])).toMatch(/^Months!B\d+$/);
  });

  it("describes its pictures and jumps to the rows that fit worst", async () => {
    await getAnswer(page);
    await openTab(page, "Evidence");
    await page.getByRole("img", { name: /^Residuals of 94 rows over the fitted values, from/ }).waitFor();
    await page.getByRole("img", { name: /^Residuals in the order of the rows/ }).waitFor();
    await page.getByRole("img", { name: /^Correlations of the residuals .* at lags 1 to 23, bounds ±0.2/ }).waitFor();
    await page.getByRole("img", { name: /^Residuals in order against a normal law/ }).waitFor();
    for (const picture of ["over fitted", "through time", "own past", "normal law"]) {
      await button(page, new RegExp(`^Figures behind it .*${picture}`)).click();
      await page
        .getByRole("region", { name: new RegExp(picture) })
        .getByRole("row")
        .nth(3)
        .waitFor();
    }
    await page
      .getByRole("region", { name: /through time/ })
      .getByRole("button", { name: "row 3", exact: true })
      .click();
    expect(await page.evaluate(() => window.stage.host.gone.splice(0))).toEqual(["Months!A3:F3"]);
    await page
      .getByRole("button", { name: /^A\d+:F\d+$/ })
      .first()
      .click();
    expect(await page.evaluate(() => window.stage.host.gone[0])).toMatch(/^Months!A\d+:F\d+$/);
  });
});

describe("work and faults", () => {
  it("shows progress, can be cancelled, and keeps the focus", async () => {
    await useSelection(page);
    await allowTextNumbers(page);
    await page.evaluate(() => (window.stage.hold = "next"));
    await button(page, "Get the answer").focus();
    await page.keyboard.press("Enter");
    await page.getByRole("progressbar", { name: "Finding the answer" }).waitFor();
    await page.getByText("Fitting, 40 %").waitFor();
    await button(page, "Cancel").click();
    await button(page, "Get the answer").waitFor();
    expect(await announced(page)).toContain("Cancelled.");
    expect(await focused(page)).toBe("H1 Months!A1:F97");
  });

  it("says what went wrong, where, and what to do; the cells jump", async () => {
    await useSelection(page);
    await allowTextNumbers(page);
    await page.evaluate(
      () =>
        (window.stage.refusal = {
          code: "error-cells",
          column: "Price index",
          cells: ["Months!C14"],
          values: ["#DIV/0!"],
          count: 1,
        }),
    );
    await button(page, "Get the answer").click();
    const alert = page.getByRole("alert");
    await alert.getByText(/column "Price index" shows the error "#DIV\/0!"/).waitFor();
    await alert.getByRole("button", { name: "Months!C14" }).click();
    expect(await page.evaluate(() => window.stage.host.gone)).toEqual(["Months!C14"]);
    await alert.getByRole("button", { name: "Dismiss" }).click();
    expect(await alert.innerText()).toBe("");
    expect(await focused(page)).toBe("H1 Months!A1:F97");
  });

  it("owns up to a fault of its own, with details to copy", async () => {
    await page.evaluate(() => {
      window.stage.host.hold = () => Promise.reject(new Error("something broke"));
    });
    await button(page, "Use selection").click();
    await page.getByText("Footing made a mistake.").waitFor();
    expect(await page.getByLabel("Details of the fault").inputValue()).toContain("something broke");
    await button(page, "Copy the details").click();
    await page.getByText(/^(Copied\.|The text is selected)/).waitFor();
    const selected = (): string =>
      document.querySelector("textarea")?.value.slice(0, document.querySelector("textarea")?.selectionEnd) ?? "";
    expect(await page.evaluate(selected)).toContain("something broke");
    await button(page, "Dismiss").click();
    await page.getByText("Footing made a mistake.").waitFor({ state: "detached" });
  });

  it("owns up when it cannot even be drawn", async () => {
    await page.evaluate(() => {
      const broken = { kind: "places found", places: null } as unknown as Parameters<
        typeof window.stage.pane.store.dispatch
      >[0];
      window.stage.pane.store.dispatch(broken);
    });
    await page.getByText("Footing made a mistake.").waitFor();
    expect(await page.getByLabel("Details of the fault").inputValue()).toContain("TypeError");
    expect(faults.splice(0)).not.toEqual([]);
  });
});
