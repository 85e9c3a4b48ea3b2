import type { Page } from "playwright-core";
import { describe, expect, it } from "vitest";
import { claimReviewFixture, gravest, slight, smaller } from "../support/reviewFixture.ts";
import { paneForEachTest } from "./panePage/paneForEachTest.ts";
import { announced, button, focused, heading, listMany, openTab } from "./panePage/steps.ts";

let page: Page;
paneForEachTest(async (opened) => {
  page = opened;
  await openTab(page, "Review");
});

const list = () => button(page, "List the regressions in this workbook").click();
const gone = (): Promise<string[]> => page.evaluate(() => [...window.stage.host.gone]);

const mostStops = 60;

/** Tabs on until the control with that text has the focus. */
async function tabTo(wanted: string | RegExp): Promise<void> {
  for (let stop = 0; stop < mostStops; stop++) {
    await page.keyboard.press("Tab");
    const text = await page.evaluate(() => document.activeElement?.textContent ?? "");
    if (typeof wanted === "string" ? text === wanted : wanted.test(text)) return;
  }
  throw new Error(`"${String(wanted)}" is not reached with the Tab key.`);
}

async function openGravest(): Promise<void> {
  await list();
  await heading(page, "2 regressions found").waitFor();
  await button(page, /^Repairs explained by Price index ?Changes the conclusion/).click();
  await heading(page, "Findings").waitFor();
}

describe("the section Review", () => {
  it("says what a review can and cannot show before it begins", async () => {
    await heading(page, "Check a regression that someone else built").waitFor();
    await page.getByText("It does not show why the work was done so, nor that anything was meant").waitFor();
  });

  it("lists regressions with their place and how they came out, says so aloud, and moves the focus there", async () => {
    await list();
    await button(page, /Handover!A4:C6, typed numbers/).waitFor();
    await button(page, /Nothing found ?Sums!D2, a formula with SLOPE/).waitFor();
    await expect.poll(() => announced(page)).toContain("2 regressions reviewed");
    expect(await focused(page)).toBe("H1 2 regressions found");
    await page.getByText("It reads its range with OFFSET.").waitFor();
  });

  it("parts a long list by sheets, opens and narrows it by keyboard, and keeps that", async () => {
    await listMany(page);
    const groups = page.getByRole("heading", { level: 2 }).getByRole("button");
    await expect.poll(() => groups.count()).toBe(3);
    expect(await groups.evaluateAll((all) => all.map((one) => one.getAttribute("aria-expanded")))).toEqual(
      Array.from({ length: 3 }, () => "false"),
    );
    await tabTo(/^Prices/);
    expect(await page.evaluate(() => document.activeElement!.textContent)).toBe(
      "Prices 10 regressions: 5 change the conclusion, 5 nothing found",
    );
    const entries = page.getByRole("button", { name: /explained by Price index/ });
    expect(await entries.count()).toBe(0);
    await page.keyboard.press("Enter");
    await expect.poll(() => entries.count()).toBe(10);

    await page.getByRole("checkbox", { name: "Only those with findings" }).focus();
    await page.keyboard.press("Space");
    await expect.poll(() => entries.count()).toBe(5);
    await expect.poll(() => announced(page)).toContain("15 of 30 regressions shown.");
    expect(await button(page, /Nothing found/).count()).toBe(0);

    await entries.nth(2).press("Enter");
    await heading(page, "Findings").waitFor();
    await page.getByText("Prices!B6").first().waitFor();
    await button(page, "All 30 regressions").press("Enter");
    await expect.poll(() => entries.count()).toBe(5);
    await button(page, /^Prices/).press("Space");
    await expect.poll(() => entries.count()).toBe(0);
  });

  it("folds what is said of the sheets where it is much", async () => {
    await listMany(page);
    const craft = page.getByText("A cell of the data holds text.");
    expect(await craft.count()).toBe(0);
    await button(page, "14 findings").press("Enter");
    await expect.poll(() => craft.count()).toBe(14);
  });

  it("shows one with its verdict, its findings gravest first, and the numbers side by side", async () => {
    await openGravest();
    expect(await focused(page)).toBe("H1 Repairs explained by Price index");
    await page.getByText(claimReviewFixture.verdict).first().waitFor();
    const text = await page.getByRole("main").innerText();
    const places = [gravest, smaller, slight].map(({ what }) => text.indexOf(what));
    expect(places).toEqual(places.toSorted((one, other) => one - other));
    const table = page.getByRole("table", { name: "Reported and recomputed" });
    const lines = (await table.innerText()).replaceAll(/\s+/g, " ");
    expect(lines).toContain("reported recomputed as explained");
    expect(lines).toContain("coefficient of Price index B6 differs -1.234 -1.312 -1.234");
    expect(lines).toContain("R-squared B8 agrees 62% 62% 62%");
  });

  it("says what had to be taken for granted, and leads to what a review can show", async () => {
    await openGravest();
    await page.getByText("The outcome is taken to be Repairs").waitFor();
    await button(page, /^What a review can show/).click();
    await heading(page, "What a review can and cannot show").waitFor();
    await button(page, "Back to Review").click();
    await heading(page, "Findings").waitFor();
  });

  it("jumps to the cells of a finding, of a number and of the report", async () => {
    await openGravest();
    await button(page, "Months!C10").click();
    await button(page, "B8").click();
    await button(page, "Handover!A4:C6").click();
    expect(await gone()).toEqual(["Months!C10", "Handover!B8", "Handover!A4:C6"]);
  });

  it("writes what is shown, and says where", async () => {
    await openGravest();
    await button(page, "Write to a review sheet").click();
    await button(page, "Repairs review").click();
    expect(await gone()).toEqual(["'Repairs review'!A1"]);
    await button(page, "All 2 regressions").click();
    await button(page, "Write all 2 reviews to a sheet").click();
    await button(page, "Repairs review 2").waitFor();
  });

  it("gives the text for a letter", async () => {
    await openGravest();
    await button(page, "As text").click();
    const text = await page.getByLabel("The review as text").inputValue();
    expect(text).toContain(claimReviewFixture.verdict);
    expect(text).not.toContain("Sums!D2");
    await button(page, "Copy as text").click();
    await page.getByText(/^(Copied\.|The text is selected: copy it with the keys\.)$/).waitFor();
  });

  it("opens the data of a regression in the section Data", async () => {
    await openGravest();
    await button(page, "Open the data and answer it yourself").click();
    await heading(page, "Months!A4:C10").waitFor();
    const selected = page.getByRole("tab", { selected: true });
    expect(await selected.innerText()).toBe("Data");
    expect(await focused(page)).toBe("H1 Months!A4:C10");
  });

  it("lets the data that typed results were taken to mean be put right", async () => {
    await openGravest();
    await button(page, "Other data are meant").click();
    const field = (name: string) => page.getByRole("textbox", { name });
    expect(await field("Cells that report it").inputValue()).toBe("Handover!A4:C6");
    expect(await field("Outcome: heading or cells").inputValue()).toBe("Months!B5:B9");
    await field("Drivers, in the order of the report").fill("Rainy days");
    await button(page, "Review these results").click();
    await heading(page, "2 regressions found").waitFor();
    const { asked } = await page.evaluate(() => window.stage.pane.store.get().review!);
    expect(asked.pointed).toEqual({ reported: "Handover!A4:C6", outcome: "Months!B5:B9", drivers: ["Rainy days"] });
  });

  it("shows how far it has come, can be cancelled, and goes on with what is left", async () => {
    await page.evaluate(() => (window.stage.hold = "next"));
    await list();
    await page.getByText("Handover!A4:C6: Trying what explains the numbers, 25 %").waitFor();
    await button(page, "Cancel").click();
    await page.getByText("2 regressions not reviewed yet.").waitFor();
    await page.evaluate(() => (window.stage.hold = null));
    await button(page, "Go on").click();
    await page
      .getByText(/^2 regressions reviewed/)
      .first()
      .waitFor();
  });

  it("goes from the tab to a written review by keyboard alone", async () => {
    await page.getByRole("tab", { name: "Data" }).click();
    await page.keyboard.press("End");
    await tabTo("List the regressions in this workbook");
    await page.keyboard.press("Enter");
    await expect.poll(() => focused(page)).toBe("H1 2 regressions found");
    await tabTo(/^Repairs explained by Price index.*typed numbers$/);
    await page.keyboard.press("Enter");
    await expect.poll(() => focused(page)).toBe("H1 Repairs explained by Price index");
    await tabTo("Months!C10");
    await page.keyboard.press("Enter");
    await expect.poll(gone).toEqual(["Months!C10"]);
    await tabTo("Write to a review sheet");
    await page.keyboard.press("Enter");
    await button(page, "Repairs review").waitFor();
  });

  it("says what to do where nothing is found", async () => {
    await page.evaluate(() => (window.stage.listed = { claims: [], unread: [], craft: [] }));
    await list();
    await heading(page, "No regression was found").waitFor();
    await page.getByText("If results are typed in, select them and say where they come from.").waitFor();
    expect(await announced(page)).toBe("No regression was found.");
  });

  it("takes the selection as a report, and keeps it where more has to be said", async () => {
    await page.evaluate(() => (window.stage.host.refusals.read = { code: "no-report", where: "Months!A1:F97" }));
    await button(page, "Review the selected cells").click();
    await page.getByRole("alert").getByText("No reported regression can be read from Months!A1:F97.").waitFor();
    await page.evaluate(() => delete window.stage.host.refusals.read);
    await button(page, "Review the selected cells").click();
    await heading(page, "2 regressions found").waitFor();
    await button(page, "Review something else").click();
    expect(await page.getByRole("textbox", { name: "Cells that report it" }).inputValue()).toBe("Months!A1:F97");
    await button(page, "Selection for: Outcome: heading or cells").click();
    expect(await page.getByRole("textbox", { name: "Outcome: heading or cells" }).inputValue()).toBe("Months!A1:F97");
    await button(page, "Review these results").press("Enter");
    await expect.poll(() => announced(page)).toContain("2 regressions reviewed");
  });
});
