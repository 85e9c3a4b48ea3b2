import { build } from "esbuild";
import type { Browser, BrowserContextOptions, Page } from "playwright-core";

/** The page's script, the pane and the core with it, made once a run. */
let script: Promise<string> | null = null;

async function bundle(): Promise<string> {
  const { outputFiles } = await build({
    entryPoints: [new URL("page.tsx", import.meta.url).pathname],
    bundle: true,
    write: false,
    format: "iife",
    jsx: "automatic",
    minify: true,
    define: { "process.env.NODE_ENV": '"production"' },
  });
  return outputFiles[0]!.text;
}

const html = `<!doctype html><html lang="en"><head><meta charset="utf-8"><title>Footing</title>
<meta name="viewport" content="width=device-width, initial-scale=1"></head><body><div id="pane"></div></body></html>`;

/** A secure address that no server answers: the page is served from here, and nothing else is. */
const address = "https://pane.test/";

export interface Look {
  readonly width: number;
  readonly height?: number;
  readonly colorScheme?: "light" | "dark";
  readonly forcedColors?: "active" | "none";
}

/** The pane on a spreadsheet that stands in memory, as wide and in the colours asked for. */
export async function openPane(browser: Browser, look: Look): Promise<Page> {
  script ??= bundle();
  const text = await script;
  const { width, height = 640, ...colours } = look;
  const options: BrowserContextOptions = { viewport: { width, height }, reducedMotion: "reduce", ...colours };
  const page = await browser.newPage(options);
  page.setDefaultTimeout(10_000);
  await page.route(`${address}**`, (route) => route.fulfill({ contentType: "text/html; charset=utf-8", body: html }));
  await page.goto(address);
  await page.addScriptTag({ content: text });
  return page;
}
