/* Draws the icon files from the two drawings: tsx assets/icons/draw.ts */
import { readFile, writeFile } from "node:fs/promises";
import type { Page } from "playwright-core";
import { launchBrowser } from "../../test/browser/support/browser.ts";

/** Every size that the ribbon, the add-in list and the store ask for. */
const sizes = [16, 20, 24, 32, 40, 48, 64, 80, 96, 128];
/** Up to this size the points of the full drawing would blur: the drawing without them is used. */
const largestSmall = 24;

const folder = new URL(".", import.meta.url);

async function drawIcon(page: Page, size: number): Promise<void> {
  const drawing = size <= largestSmall ? "mark-small.svg" : "mark.svg";
  const svg = await readFile(new URL(drawing, folder), "utf8");
  await page.setViewportSize({ width: size, height: size });
  await page.setContent(`<style>body{margin:0}svg{display:block;width:${size}px;height:${size}px}</style>${svg}`);
  await writeFile(new URL(`footing-${size}.png`, folder), await page.screenshot({ omitBackground: true }));
}

const browser = await launchBrowser();
const page = await browser.newPage();
for (const size of sizes) await drawIcon(page, size);
await browser.close();
