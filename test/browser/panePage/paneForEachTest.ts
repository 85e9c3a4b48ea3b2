import type { Browser, Page } from "playwright-core";
import { afterAll, afterEach, beforeAll, beforeEach } from "vitest";
import { launchBrowser } from "../support/browser.ts";
import { openPane } from "./openPane.ts";

/**
 * Gives every test of a file a pane of its own, as narrow as Excel's.
 * @param take - takes the page and brings it to where the tests begin.
 */
export function paneForEachTest(take: (page: Page) => Promise<void> | void): void {
  let browser: Browser;
  let page: Page;
  beforeAll(async () => {
    browser = await launchBrowser();
  });
  afterAll(() => browser.close());
  beforeEach(async () => {
    page = await openPane(browser, { width: 320 });
    await take(page);
  });
  afterEach(() => page.close());
}
