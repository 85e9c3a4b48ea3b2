import { readFile } from "node:fs/promises";
import { join } from "node:path";
import type { Browser } from "playwright-core";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { launchBrowser } from "./support/browser.ts";
import { startSite, type Site } from "./support/site.ts";

/** The real loader and what it fetches, answered from the package; the address is the vendor's. */
const vendor = "https://appsforoffice.microsoft.com/lib/1/hosted/";
const library = join(import.meta.dirname, "../../node_modules/@microsoft/office-js/dist");

let site: Site;
let browser: Browser;
beforeAll(async () => {
  [site, browser] = await Promise.all([startSite(), launchBrowser()]);
});
afterAll(async () => {
  await browser.close();
  await site.close();
});

describe("the built pane in a browser of its own, with Excel's real loader", () => {
  it("says that it works inside Excel, and throws nothing", async () => {
    const page = await browser.newPage();
    const faults: string[] = [];
    page.on("pageerror", (error) => faults.push(error.message));
    await page.route(`${vendor}**`, async (route) => {
      const file = new URL(route.request().url()).pathname.slice(new URL(vendor).pathname.length);
      const body = await readFile(join(library, file)).catch(() => null);
      return body === null ? route.abort() : route.fulfill({ body, contentType: "text/javascript" });
    });
    await page.goto(`${site.address}/taskpane.html`);
    await page.getByText(/inside Excel/).waitFor({ timeout: 30_000 });
    expect(faults).toEqual([]);
    await page.close();
  });

  it("says so too, and throws nothing, where that loader is blocked", async () => {
    const page = await browser.newPage();
    const faults: string[] = [];
    page.on("pageerror", (error) => faults.push(error.message));
    await page.route(`${vendor}**`, (route) => route.abort());
    await page.goto(`${site.address}/taskpane.html`);
    await page.getByText(/inside Excel/).waitFor({ timeout: 30_000 });
    expect(faults).toEqual([]);
    await page.close();
  });
});
