import type { Page } from "playwright-core";
import { expect, it } from "vitest";
import { paneForEachTest } from "./panePage/paneForEachTest.ts";
import { button, focused, heading, roleOf, useSelection } from "./panePage/steps.ts";

let page: Page;
paneForEachTest((opened) => {
  page = opened;
});

it("chooses other data in place of those before, each part of the section once", async () => {
  await useSelection(page);
  for (const address of ["Months!A1:F49", "Months!A1:F97"]) {
    if ((await page.getByLabel("Or type an address").count()) === 0) await button(page, "Choose other data").click();
    await page.getByLabel("Or type an address").fill(address);
    await button(page, "Read it").click();
    await heading(page, address).waitFor();
    expect(await button(page, "Choose other data").count()).toBe(1);
    expect(await page.getByRole("combobox", { name: /^Role of/ }).count()).toBe(6);
  }
});

it("keeps the months of a season from burying the drivers", async () => {
  await useSelection(page);
  await button(page, "Read them as numbers").click();
  await button(page, /^Drivers made from time/).click();
  await page.getByRole("checkbox", { name: "an indicator for each month but one" }).check();
  await button(page, "Get the answer").click();
  await heading(page, "Repairs explained by Price index, Advertising, Rainy days and the season").waitFor();
  const verdict = page.getByRole("region", { name: "Verdict" });
  expect(await verdict.getByRole("listitem").count()).toBe(3);
  await button(page, "The season, in 11 sentences").click();
  expect(await verdict.getByRole("listitem").count()).toBe(14);
  expect(await page.getByRole("article", { name: "March" }).count()).toBe(0);
  await button(page, "The season: 11 terms").click();
  await page.getByRole("article", { name: "March" }).waitFor();
});

it("puts right in one click what needs the user's leave alone", async () => {
  await useSelection(page);
  await button(page, "Get the answer").click();
  const alert = page.getByRole("alert");
  await alert.getByRole("button", { name: "Read them as numbers" }).click();
  expect(await alert.innerText()).toBe("");
  await page.getByText(/^94 rows can be used/).waitFor();
  await page.evaluate(
    () => (window.stage.refusal = { code: "dependent-columns", column: "Rainy days", madeOf: ["Price index"] }),
  );
  await button(page, "Get the answer").click();
  await alert.getByText(/"Rainy days" says nothing new/).waitFor();
  await alert.getByRole("button", { name: "Leave out Rainy days" }).click();
  expect(await roleOf(page, "Rainy days").inputValue()).toBe("unused");
  expect(await focused(page)).toBe("H1 Months!A1:F97");
  await page.evaluate(() => (window.stage.refusal = null));
  await button(page, "Get the answer").click();
  await heading(page, "Repairs explained by Price index and Advertising").waitFor();
});
