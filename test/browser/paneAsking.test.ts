import type { Page } from "playwright-core";
import { expect, it } from "vitest";
import { paneForEachTest } from "./panePage/paneForEachTest.ts";
import { announced, button, getAnswer, heading, openTab, roleOf, storeAs } from "./panePage/steps.ts";

let page: Page;
paneForEachTest(async (opened) => {
  page = opened;
  await getAnswer(page);
});

const estimates = () => page.getByLabel("Sums and quotients of coefficients");
const equations = () => page.getByLabel("Equations tested all at once");
const asked = () => page.getByRole("region", { name: "Asked of the coefficients" });

it("asks for a sum and a joint test by keyboard, and shows and tells what comes of them", async () => {
  await button(page, "Ask more of the coefficients").press("Enter");
  await page.getByText("Price index and Advertising together: Price index + Advertising").waitFor();
  await page.getByText(/That neither Price index nor Advertising matters: Price index = 0, Advertising = 0$/).waitFor();
  await equations().fill("Price index = 0, Advertising = 0");
  await estimates().fill("Price index + Advertising, Advertising > 0");
  await page.keyboard.press("Enter");
  await asked().waitFor();
  const sum = page.getByRole("table", { name: "Asked: Price index + Advertising", exact: true });
  expect(await sum.getByRole("row", { name: /^standard error \d/ }).count()).toBe(1);
  expect(
    await page
      .getByRole("table", { name: "Asked: Advertising > 0" })
      .getByRole("row", { name: "held against above 0 (one-sided)" })
      .count(),
  ).toBe(1);
  const joint = page.getByRole("table", { name: "The equations under each kind of standard errors" });
  expect(await joint.getByRole("row").count()).toBe(4);
  expect(await announced(page)).toMatch(
    /Price index \+ Advertising: the estimate is .* Price index = 0 and Advertising = 0, taken together:/,
  );
  expect(await button(page, "Ask more of the coefficients (4 asked)").count()).toBe(1);
  // The focus stays where it was for the next thing that is asked.
  expect(await estimates().evaluate((field) => field === document.activeElement)).toBe(true);

  await button(page, "Copy as text for a memo").click();
  expect(await page.getByRole("textbox", { name: "The answer as text" }).inputValue()).toMatch(
    /ASKED OF THE COEFFICIENTS\nPrice index \+ Advertising: the estimate is/,
  );
});

it("says beside the field what cannot be read, and leaves the answer as it was", async () => {
  await button(page, "Ask more of the coefficients").click();
  await estimates().fill("Price indx + Advertising");
  await equations().fill("Advertising > 0");
  await button(page, "Ask this").click();
  await page
    .getByText(/There is no coefficient "Price indx" in this regression\. Did you mean "Price index"\?/)
    .waitFor();
  await page.getByText(/"Advertising > 0" is not a value of the setting "joint test"\./).waitFor();
  for (const field of [estimates(), equations()]) expect(await field.getAttribute("aria-invalid")).toBe("true");
  expect(await page.getByText(/Out of date/).count()).toBe(0);
  expect(await asked().count()).toBe(0);
  await estimates().fill("Price index");
  expect(await estimates().getAttribute("aria-invalid")).not.toBe("true");
  await equations().fill("");
  await button(page, "Ask this").click();
  await asked().waitFor();
  expect(await page.getByRole("table", { name: /equations/ }).count()).toBe(0);
});

it("keeps whom predictions are for", async () => {
  await button(page, "Ask more of the coefficients").click();
  await page.getByLabel("Predictions are for").selectOption({ label: "a single row" });
  await expect.poll(() => page.evaluate(() => window.stage.pane.store.get().busy)).toBeNull();
  const { answered } = await page.evaluate(() => window.stage.pane.store.get());
  expect([answered?.question.options.predictFor, answered?.outdated]).toEqual(["single row", null]);
});

it("lets what was asked be taken back once a driver is gone", async () => {
  await button(page, "Ask more of the coefficients").click();
  await estimates().fill("Advertising");
  await button(page, "Ask this").click();
  await asked().waitFor();
  await openTab(page, "Data");
  await roleOf(page, "Advertising").selectOption("unused");
  await button(page, "Get the answer").click();
  await page.getByText(/There is no coefficient "Advertising" in this regression/).waitFor();
  await openTab(page, "Answer");
  await button(page, "Ask more of the coefficients (1 asked)").click();
  await estimates().fill("");
  await button(page, "Ask this").click();
  await heading(page, "Repairs explained by Price index and Rainy days").waitFor();
});

it("keeps what a stored set-up asks within reach while there is no answer", async () => {
  await button(page, "Ask more of the coefficients").click();
  await estimates().fill("Advertising");
  await button(page, "Ask this").click();
  await asked().waitFor();
  await openTab(page, "Data");
  await storeAs(page, "With a sum");
  await page.evaluate(() => window.stage.pane.commands.read({ kind: "address", address: "Months!A1:F49" }));
  await expect.poll(() => page.evaluate(() => window.stage.pane.store.get().answered)).toBeNull();
  await page.getByRole("button", { name: "Open With a sum", exact: true }).click();
  await heading(page, "Months!A1:F97").waitFor();
  await roleOf(page, "Advertising").selectOption("unused");
  await openTab(page, "Answer");
  await heading(page, "No answer yet").waitFor();
  await button(page, "Ask more of the coefficients (1 asked)").click();
  expect(await estimates().inputValue()).toBe("Advertising");
  await estimates().fill("Price index");
  await button(page, "Ask this").click();
  await heading(page, "Repairs explained by Price index and Rainy days").waitFor();
  await page.getByRole("table", { name: "Asked: Price index", exact: true }).waitFor();
});
