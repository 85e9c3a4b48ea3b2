import { existsSync } from "node:fs";
import { tmpdir } from "node:os";
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
  const executablePath = process.env["FOOTING_BROWSER"] ?? installedBrowser();
  return executablePath === undefined ? launchPackaged() : chromium.launch({ executablePath, args: flags });
}

function installedBrowser(): string | undefined {
  const folders = (process.env["PATH"] ?? "").split(delimiter);
  const onPath = folders.flatMap((folder) => namesOnPath.map((name) => join(folder, name)));
  return [...onPath, ...usualPlaces].find((path) => existsSync(path));
}

/** The packaged browser brings the libraries that a bare machine lacks; the machine's own are tried first. */
async function launchPackaged(): Promise<Browser> {
  const executablePath = await unpack();
  const launch = (libraries: string): Promise<Browser> =>
    chromium.launch({ executablePath, args: flags, env: { ...process.env, LD_LIBRARY_PATH: libraries } });
  try {
    return await launch("");
  } catch {
    return launch(join(tmpdir(), "al2023", "lib"));
  }
}

/** Where the package is told of this, it unpacks the libraries too. */
const asOnABareMachine = { AWS_LAMBDA_JS_RUNTIME: "nodejs20.x" };

async function unpack(): Promise<string> {
  Object.assign(process.env, asOnABareMachine);
  const { default: packaged } = await import("@sparticuz/chromium");
  return packaged.executablePath();
}

/** Run once before the suites, which would unpack over one another. */
export async function setup(): Promise<void> {
  if (process.env["FOOTING_BROWSER"] === undefined && installedBrowser() === undefined) await unpack();
}
