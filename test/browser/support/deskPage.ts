import type { Browser, BrowserContextOptions, FrameLocator, Page } from "playwright-core";
import type { Desk } from "../../../src/desk/client/desk.ts";
import { launchBrowser } from "./browser.ts";
import { startSite, type Site } from "./site.ts";

/** The desk open in a browser, as a person has it before them. */
export interface DeskPage {
  readonly page: Page;
  /** The add-in's pane. */
  readonly pane: FrameLocator;
  /** Addresses outside of the site that the page asked for; nothing may ever stand here. */
  readonly asked: readonly string[];
  /** Faults that the page or the pane threw. */
  readonly faults: readonly string[];
  readonly close: () => Promise<void>;
}

/** One browser and one site for a suite; each test takes a page of its own. */
export interface DeskSuite {
  readonly site: Site;
  readonly openDesk: (options?: BrowserContextOptions) => Promise<DeskPage>;
  readonly close: () => Promise<void>;
}

export async function startDeskSuite(): Promise<DeskSuite> {
  const [site, browser] = await Promise.all([startSite(), launchBrowser()]);
  return {
    site,
    openDesk: (options) => openDesk(browser, site, options),
    close: async () => {
      await browser.close();
      await site.close();
    },
  };
}

/** In milliseconds; a loaded machine takes its time to start a grid. */
const patience = 60_000;

async function openDesk(browser: Browser, site: Site, options: BrowserContextOptions = {}): Promise<DeskPage> {
  const context = await browser.newContext({ viewport: { width: 1280, height: 800 }, ...options });
  context.setDefaultTimeout(patience);
  const page = await context.newPage();
  const asked: string[] = [];
  const faults: string[] = [];
  await context.route(
    (url) => url.origin !== site.address && url.protocol.startsWith("http"),
    (route) => {
      asked.push(route.request().url());
      return route.abort();
    },
  );
  page.on("pageerror", (error) => faults.push(error.message));
  await page.goto(`${site.address}/desk/`);
  const pane = page.frameLocator("iframe[title='Footing']");
  await pane.getByRole("button", { name: "Use selection" }).waitFor();
  return { page, pane, asked, faults, close: () => context.close() };
}

/** Works at the sheet with the desk's own hands, in the page, while all formulas are at rest, and waits until they are again. */
export function atSheet<T>(page: Page, work: (desk: Desk) => T): Promise<T> {
  return page.evaluate(
    `(async () => {
      await globalThis.desk.settle();
      const result = (${work.toString()})(globalThis.desk);
      await globalThis.desk.settle();
      return result;
    })()`,
  );
}
