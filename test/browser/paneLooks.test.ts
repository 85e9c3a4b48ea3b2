import { readFileSync } from "node:fs";
import { createRequire } from "node:module";
import type { AxeResults } from "axe-core";
import type { Browser, Page } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { openPane } from "./panePage/openPane.ts";
import {
  allowTextNumbers,
  button,
  getAnswer,
  listMany,
  openTab,
  roleOf,
  storeAs,
  useSelection,
} from "./panePage/steps.ts";
import { launchBrowser } from "./support/browser.ts";

const axe = readFileSync(createRequire(import.meta.url).resolve("axe-core/axe.min.js"), "utf8");

let browser: Browser;
beforeAll(async () => {
  browser = await launchBrowser();
});
afterAll(() => browser.close());

const widths = [320, 400] as const;

const colours = [
  { colorScheme: "light", forcedColors: "none" },
  { colorScheme: "dark", forcedColors: "none" },
  { colorScheme: "light", forcedColors: "active" },
  { colorScheme: "dark", forcedColors: "active" },
] as const;

const open = (page: Page, ...names: (string | RegExp)[]): Promise<void> =>
  names.reduce((before, name) => before.then(() => button(page, name).first().click()), Promise.resolve());

const listRegressions = "List the regressions in this workbook";

/** Two set-ups and a kept sheet in the workbook. */
async function keepTwo(page: Page): Promise<void> {
  await getAnswer(page);
  await page.getByLabel("Live or kept").selectOption("kept");
  await button(page, "Write to the workbook").click();
  await openTab(page, "Data");
  await storeAs(page, "All drivers");
  await roleOf(page, "Price index").selectOption("unused");
  await storeAs(page, "Without price");
}

/** Every state of the pane, as a person comes to it. */
const states: Readonly<Record<string, (page: Page) => Promise<void>>> = {
  empty: () => Promise.resolve(),
  "an Excel that is too old": async (page) => {
    await page.evaluate(() => window.stage.leave({ kind: "too old", missing: "ExcelApi 1.12" }));
    await page.getByText(/ExcelApi 1\.12/).waitFor();
  },
  "no Excel": async (page) => {
    await page.evaluate(() => window.stage.leave({ kind: "no host" }));
    await page.getByText(/inside Excel/).waitFor();
  },
  "no answer": (page) => openTab(page, "Answer"),
  data: async (page) => {
    await useSelection(page);
    await open(page, /Choose other data/, /^Advertising/, /^Price index/, /95 % intervals/);
  },
  working: async (page) => {
    await useSelection(page);
    await allowTextNumbers(page);
    await page.evaluate(() => (window.stage.hold = "next"));
    await open(page, "Get the answer");
    await page.getByRole("progressbar").waitFor();
  },
  answer: async (page) => {
    await getAnswer(page);
    await open(page, "Write to the workbook", /Change how/, /Figures of Price/, /left out/);
    await page.getByLabel("Standard errors").selectOption({ label: "always classical" });
    await button(page, "Repairs answer").waitFor();
  },
  "more asked": async (page) => {
    await getAnswer(page);
    await open(page, /^Ask more/);
    const [estimates, equations] = [/^Sums and quotients/, /^Equations tested/].map((label) => page.getByLabel(label));
    await estimates!.fill("Price index + Advertising");
    await equations!.fill("Price index = 0, Rainy days = Advertising");
    await open(page, "Ask this");
    await page.getByRole("region", { name: "Asked of the coefficients" }).waitFor();
    await estimates!.fill("Price indx");
    await open(page, "Ask this");
    await page.getByText(/Did you mean "Price index"/).waitFor();
  },
  "out of date": async (page) => {
    await getAnswer(page);
    await page.evaluate(() => window.stage.host.change(5, 1, 99));
    await page.getByText(/Out of date/).waitFor();
  },
  evidence: async (page) => {
    await getAnswer(page);
    await openTab(page, "Evidence");
    await open(page, /^Figures behind it .*over fitted/, /^Figures behind it .*own past/);
  },
  help: async (page) => {
    await getAnswer(page);
    await open(page, /Help: Why three kinds/);
  },
  memo: async (page) => {
    await getAnswer(page);
    await open(page, "Copy as text for a memo");
    await page.getByRole("textbox", { name: "The answer as text" }).waitFor();
  },
  "data in groups": async (page) => {
    await useSelection(page);
    await roleOf(page, "Shop").selectOption("group");
    await roleOf(page, "Month").selectOption("second group");
    await open(page, /^Advertising/, /95 % intervals/);
    await page.getByLabel("Enters a second time").selectOption({ label: "its value some periods earlier" });
  },
  "a break to name": async (page) => {
    await useSelection(page);
    await allowTextNumbers(page);
    await open(page, /95 % intervals/);
    await page.getByLabel("Break that Chow's test asks about").selectOption("named");
    await page.getByLabel(/^First row after the break/).fill("9999");
    await page.getByText("Type the number of a row that is used.").waitFor();
  },
  "a review to begin": async (page) => {
    await openTab(page, "Review");
    await open(page, "Say where typed results come from");
  },
  reviewing: async (page) => {
    await openTab(page, "Review");
    await page.evaluate(() => (window.stage.hold = "next"));
    await open(page, listRegressions);
    await page.getByText(/explains the numbers, 25 %/).waitFor();
  },
  "regressions found": async (page) => {
    await openTab(page, "Review");
    await open(page, listRegressions, "Write all 2 reviews to a sheet", "Review something else");
    await button(page, "Repairs review").waitFor();
  },
  "many regressions found": async (page) => {
    await listMany(page);
    await page.getByLabel("Only those with findings").check();
    await open(page, /^Costs of running/, /^Prices/);
    await page.getByText("15 of 30 regressions shown.").first().waitFor();
  },
  "a regression reviewed": async (page) => {
    await openTab(page, "Review");
    await open(page, listRegressions, /Changes the conclusion/, "As text", "Copy as text");
  },
  "no regression found": async (page) => {
    await openTab(page, "Review");
    await page.evaluate(() => (window.stage.listed = { ...window.stage.listed, claims: [] }));
    await open(page, listRegressions);
    await page.getByText("The reasons stand below.").waitFor();
  },
  "what the workbook keeps": async (page) => {
    await keepTwo(page);
    await page.evaluate(() => window.stage.host.change(5, 1, 99));
    await page.getByText("Out of date: its cells have changed.").waitFor();
    await open(page, "Rename All drivers", "Remove Without price");
  },
  "a set-up without its columns": async (page) => {
    await keepTwo(page);
    await page.evaluate(() => {
      window.stage.host.hiddenRows = [3];
      window.stage.host.change(0, 2, "Price level");
    });
    await open(page, "Open All drivers");
    await page.getByText(/There is no column "Price index"/).waitFor();
  },
  "a comparison": async (page) => {
    await keepTwo(page);
    await page.getByLabel("Compare All drivers").check();
    await page.getByLabel("Compare Without price").check();
    await open(page, "Compare 2 side by side");
    await page.getByRole("table", { name: "Drivers of the models" }).waitFor();
    await page.evaluate(() => window.stage.host.change(5, 1, 99));
    await page.getByText("Out of date: cells behind the models have changed.").waitFor();
  },
  "no permission": async (page) => {
    await getAnswer(page);
    await page.evaluate(() => (window.stage.host.refusals.write = { code: "workbook-protected" }));
    await open(page, "Write to the workbook");
    await page
      .getByRole("alert")
      .getByText(/structure is protected/)
      .waitFor();
  },
  "a fault to mend": async (page) => {
    await useSelection(page);
    await open(page, "Get the answer");
    await page.getByRole("alert").getByRole("button", { name: "Dismiss" }).waitFor();
  },
  "a fault of ours": async (page) => {
    await page.evaluate(() => {
      window.stage.host.hold = () => Promise.reject(new Error("something broke"));
    });
    await open(page, "Use selection");
    await page.getByText("Footing made a mistake.").waitFor();
  },
};

describe.each(widths)("%i pixels wide", (width) => {
  it.each(Object.entries(states))("the state %s is sound in light, dark and forced colours", async (_, reach) => {
    const page = await openPane(browser, { width });
    await reach(page);
    for (const colour of colours) {
      await page.emulateMedia(colour);
      await atRest(page);
      const found = { violations: await violationsOn(page), colour };
      expect(found).toEqual({ violations: [], colour });
    }
    expect(await widerThanPane(page)).toEqual([]);
    expect(await outOfLine(page)).toEqual([]);
    expect(await smallTargets(page)).toEqual([]);
    await page.close();
  });
});

/** Colours fade from one theme to the next; what never ends, such as a bar of progress, is not waited for. */
const atRest = (page: Page): Promise<void> =>
  page.evaluate(async () => {
    await new Promise((resolve) => requestAnimationFrame(() => requestAnimationFrame(resolve)));
    const ending = document.getAnimations().filter(({ effect }) => effect?.getTiming().iterations !== Infinity);
    await Promise.allSettled(ending.map(({ finished }) => finished));
  });

async function violationsOn(page: Page): Promise<string[]> {
  await page.addScriptTag({ content: axe });
  const results = await page.evaluate(() =>
    (window as unknown as { axe: { run: () => Promise<AxeResults> } }).axe.run(),
  );
  return results.violations.map(({ id, nodes }) => `${id}: ${nodes.map(({ html }) => html).join(" ")}`);
}

/** What reaches beyond the right edge: hidden overflow would cut it off unseen. */
const widerThanPane = (page: Page): Promise<string[]> =>
  page.evaluate(() => {
    const edge = document.documentElement.clientWidth + 0.5;
    const isShown = (element: Element): boolean => element.getBoundingClientRect().width > 1;
    return [...document.querySelectorAll("main *, header *, footer *")]
      .filter((element) => isShown(element) && element.getBoundingClientRect().right > edge)
      .map((element) => element.outerHTML.slice(0, 120));
  });

/** What reaches beyond the right end of the lines, into the room of the scroll bar; boxes that scroll and pictures may. */
const outOfLine = (page: Page): Promise<string[]> =>
  page.evaluate(() => {
    const lines = document.querySelector("#section, main > h1")!;
    const edge = lines.getBoundingClientRect().right + 0.5;
    return [...document.querySelectorAll("#section *, main > *")]
      .filter((element) => element.closest("[tabindex='0'], [aria-hidden='true']") === null)
      .filter((element) => element.getBoundingClientRect().right > edge && element.getBoundingClientRect().width > 1)
      .map((element) => element.outerHTML.slice(0, 120));
  });

/** Controls smaller than 24 by 24 pixels; the label of a radio button or switch counts with it. */
const smallTargets = (page: Page): Promise<string[]> =>
  page.evaluate(() =>
    [...document.querySelectorAll("button, select, input, textarea, a[href]")]
      .filter((element) => element.getClientRects().length > 0)
      .filter((element) => {
        const { width, height } = element.getBoundingClientRect();
        return width < 24 || height < 24;
      })
      .map((element) => element.outerHTML.slice(0, 160)),
  );

it("follows the host's theme before the system's", async () => {
  const page = await openPane(browser, { width: 320, colorScheme: "light" });
  const ground = () =>
    page.evaluate(() => getComputedStyle(document.querySelector(".fui-FluentProvider")!).backgroundColor);
  const light = await ground();
  await page.evaluate(() => {
    window.stage.hostIsDark = true;
    window.dispatchEvent(new Event("focus"));
  });
  await expect.poll(ground).not.toBe(light);
  expect(await ground()).toBe("rgb(28, 31, 33)");
  await page.close();
});
