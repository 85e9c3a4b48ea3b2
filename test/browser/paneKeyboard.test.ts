import type { Page } from "playwright-core";
import { expect, it } from "vitest";
import { paneForEachTest } from "./panePage/paneForEachTest.ts";
import { focused, heading } from "./panePage/steps.ts";

let page: Page;
paneForEachTest(async (opened) => {
  page = opened;
  await heading(page, "What holds, and how firmly?").waitFor();
});

const press = (...keys: string[]): Promise<void> =>
  keys.reduce((before, key) => before.then(() => page.keyboard.press(key)), Promise.resolve());

/** The accessible name of what has the focus, as far as these tests need it. */
const name = (): Promise<string> =>
  page.evaluate(() => {
    const { activeElement } = document;
    const label =
      activeElement instanceof HTMLElement && "labels" in activeElement
        ? (activeElement.labels as NodeListOf<HTMLElement> | null)?.[0]
        : null;
    return activeElement?.getAttribute("aria-label") ?? label?.textContent ?? activeElement?.textContent ?? "";
  });

/** Walks on with the Tab key until something has the focus whose name matches; gives up after a full round. */
async function tabTo(wanted: RegExp): Promise<void> {
  for (let step = 0; step < 80; step++) {
    await page.keyboard.press("Tab");
    if (wanted.test(await name())) return;
  }
  throw new Error(`The Tab key never reaches ${String(wanted)}.`);
}

it("goes from cells to a written answer by keyboard alone", async () => {
  await tabTo(/^Use selection$/);
  await press("Enter");
  await heading(page, "Months!A1:F97").waitFor();
  await tabTo(/^Role of Shop/);
  await press("d");
  await tabTo(/^through time$/);
  await press("ArrowUp");
  await page.getByText(/order of the rows means nothing/).waitFor();
  await press("ArrowDown");
  await tabTo(/^Read them as numbers$/);
  await press("Enter");
  await page.getByText(/^94 rows can be used/).waitFor();
  await tabTo(/^Get the answer$/);
  await press("Enter");
  await heading(page, /^Repairs explained by .* Shop/).waitFor();
  expect(await focused(page)).toMatch(/^H1 Repairs explained by/);
  await tabTo(/^Write to the workbook$/);
  await press("Enter");
  await page.getByRole("button", { name: "Repairs answer" }).waitFor();
  expect(await page.evaluate(() => window.stage.host.plans.length)).toBe(1);
  expect(await focused(page)).not.toMatch(/^BODY/);
});

it("walks through the tabs with the arrows, Home and End", async () => {
  await press("Tab");
  expect(await name()).toBe("Data");
  await press("ArrowRight");
  expect(await name()).toBe("Answer");
  await press("End");
  expect(await name()).toBe("Review");
  await press("ArrowRight");
  expect(await name()).toBe("Data");
  await press("ArrowLeft", "Home");
  expect(await name()).toBe("Data");
  expect(await page.getByRole("tab", { selected: true }).innerText()).toBe("Data");
});

it("shows where the focus is", async () => {
  const outlined = await page.evaluate(async () => {
    const tab = document.querySelector<HTMLElement>("[role=tab]");
    tab?.focus({ focusVisible: true } as FocusOptions);
    await new Promise(requestAnimationFrame);
    return tab === null ? "" : getComputedStyle(tab).outlineStyle;
  });
  expect(outlined).toBe("solid");
});

it("never hides what has the focus behind the bar below", async () => {
  await page.setViewportSize({ width: 320, height: 378 });
  await tabTo(/^Use selection$/);
  await press("Enter");
  await heading(page, "Months!A1:F97").waitFor();
  for (let step = 0; step < 20; step++) {
    await press("Tab");
    const hidden = await page.evaluate(() => {
      const { activeElement } = document;
      const box = activeElement?.getBoundingClientRect();
      if (activeElement == null || box === undefined || activeElement === document.body) return null;
      const top = document.elementFromPoint(box.left + box.width / 2, box.top + Math.min(box.height / 2, 12));
      return activeElement.contains(top) || top?.contains(activeElement) === true ? null : activeElement.outerHTML;
    });
    expect(hidden).toBeNull();
  }
});
