import type { Page } from "playwright-core";

/** What a person does in the pane, by role and label. */
export const button = (page: Page, name: string | RegExp) => page.getByRole("button", { name });

export const heading = (page: Page, name: string | RegExp) => page.getByRole("heading", { name });

export const roleOf = (page: Page, column: string) =>
  page.getByRole("combobox", { name: new RegExp(`^Role of ${column}( \\(a guess\\))?$`) });

export async function useSelection(page: Page): Promise<void> {
  await button(page, "Use selection").click();
  await heading(page, "Months!A1:F97").waitFor();
}

export async function allowTextNumbers(page: Page): Promise<void> {
  await button(page, "Read them as numbers").click();
  await page.getByText(/^94 rows can be used/).waitFor();
}

export async function getAnswer(page: Page): Promise<void> {
  await useSelection(page);
  await allowTextNumbers(page);
  await button(page, "Get the answer").click();
  await heading(page, /^Repairs explained by/).waitFor();
}

/** Stores what is chosen in the Data section. */
export async function storeAs(page: Page, name: string): Promise<void> {
  await page.getByLabel("Store this set-up as").fill(name);
  await page.keyboard.press("Enter");
  await page.getByRole("button", { name: `Open ${name}`, exact: true }).waitFor();
}

export const openTab = (page: Page, name: string) => page.getByRole("tab", { name }).click();

/** Lists a workbook of thirty regressions on three sheets, every second one with findings. */
export async function listMany(page: Page): Promise<void> {
  await openTab(page, "Review");
  await page.evaluate(() => {
    const { claims, craft, unread } = window.stage.listed;
    const sheets = ["Prices", "'Costs of running the shops, by town'", "Weeks"];
    const places = Array.from({ length: 30 }, (_, at) => `${sheets[Math.floor(at / 10)]!}!B${at + 2}`);
    window.stage.listed = {
      unread,
      craft: Array.from({ length: 14 }, () => craft[0]!),
      claims: places.map((place, at) => ({ ...claims[at % 2]!, place })),
    };
  });
  await button(page, "List the regressions in this workbook").click();
  await page
    .getByText(/^30 regressions reviewed/)
    .first()
    .waitFor();
  await page.getByRole("checkbox", { name: "Only those with findings" }).waitFor();
}

/** What screen readers were told last. */
export const announced = (page: Page): Promise<string> =>
  page.evaluate(() => [...document.querySelectorAll("[role=status]")].map((region) => region.textContent).join(""));

/** What has the focus, in words. */
export const focused = (page: Page): Promise<string> =>
  page.evaluate(() => {
    const { activeElement } = document;
    return `${activeElement?.tagName ?? ""} ${activeElement?.textContent ?? ""}`;
  });
