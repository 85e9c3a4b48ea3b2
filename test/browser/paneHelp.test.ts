import type { Page } from "playwright-core";
import { expect, it } from "vitest";
import { paneForEachTest } from "./panePage/paneForEachTest.ts";
import { button, focused, getAnswer, heading, openTab, useSelection } from "./panePage/steps.ts";

let page: Page;
paneForEachTest((opened) => {
  page = opened;
});

const linkTo = (title: string) => button(page, new RegExp(`Help: ${title}$`)).first();

it.each([
  ["Which of the four cases", []],
  ["Why three kinds of standard errors", []],
  ["What firm means", []],
  ["What the tests can miss", []],
  ["Live and kept sheets", []],
  ["What left-out rows are", [/left out$/]],
  ["What the reference distribution does", [/^Figures of Price/]],
])("the answer leads to %s, and back to the very link", async (title, openBefore) => {
  await getAnswer(page);
  for (const name of openBefore) await button(page, name).click();
  const link = linkTo(title);
  await link.focus();
  await page.keyboard.press("Enter");
  await heading(page, title).waitFor();
  expect(await focused(page)).toBe(`H1 ${title}`);
  expect(await heading(page, /^Repairs explained by/).isVisible()).toBe(false);
  await button(page, "Back to Answer").click();
  expect(await link.evaluate((element) => element === document.activeElement)).toBe(true);
  expect(await link.isVisible()).toBe(true);
});

it("the data lead to groups; Escape leads back", async () => {
  await useSelection(page);
  const link = linkTo("Rows in groups");
  await link.click();
  await heading(page, "Rows in groups").waitFor();
  await page.keyboard.press("Escape");
  await heading(page, "Months!A1:F97").waitFor();
  expect(await link.evaluate((element) => element === document.activeElement)).toBe(true);
});

it("leads from page to page, and back to where one came from", async () => {
  await getAnswer(page);
  const link = linkTo("What firm means");
  await link.click();
  await button(page, "Rows in groups").click();
  expect(await focused(page)).toBe("H1 Rows in groups");
  await button(page, "Back to Answer").click();
  expect(await link.evaluate((element) => element === document.activeElement)).toBe(true);
});

it("is closed by going to another section, which takes no focus back", async () => {
  await getAnswer(page);
  await linkTo("What firm means").click();
  await openTab(page, "Evidence");
  await heading(page, "Evidence on Repairs").waitFor();
  expect(await focused(page)).toBe("BUTTON Evidence");
  await openTab(page, "Answer");
  await heading(page, /^Repairs explained by/).waitFor();
});
