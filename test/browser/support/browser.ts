import sparticuz from "@sparticuz/chromium";
import { existsSync } from "node:fs";
import { delimiter, join } from "node:path";
import { chromium, type Browser } from "playwright-core";

// As root and on closed networks Chromium needs these; without them it looks up hosts of its maker at every start.
const flags = [
  "--no-sandbox",
  "--disable-gpu",
  "--disable-quic",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];

const namesOnPath = ["chromium", "chromium-browser", "google-chrome", "google-chrome-stable", "microsoft-edge"];

const usualPlaces = [
  "/Applications/Google Chrome.app/Contents/MacOS/Google Chrome",
  "/Applications/Microsoft Edge.app/Contents/MacOS/Microsoft Edge",
  "/Applications/Chromium.app/Contents/MacOS/Chromium",
  String.raw`C:\Program Files\Google\Chrome\Application\chrome.exe`,
  String.raw`C:\Program Files (x86)\Microsoft\Edge\Application\msedge.exe`,
];

/** The Chromium that FOOTING_BROWSER names, else an installed one, else the one inside the npm package. */
export async function launchBrowser(): Promise<Browser> {
  const executablePath = process.env["FOOTING_BROWSER"] ?? installedBrowser() ?? (await sparticuz.executablePath());
  return chromium.launch({ executablePath, args: flags });
}

function installedBrowser(): string | undefined {
  const folders = (process.env["PATH"] ?? "").split(delimiter);
  const onPath = folders.flatMap((folder) => namesOnPath.map((name) => join(folder, name)));
  return [...onPath, ...usualPlaces].find((path) => existsSync(path));
}
