import { execFile } from "node:child_process";
import { existsSync, readdirSync } from "node:fs";
import { mkdtemp, readFile, rm } from "node:fs/promises";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { promisify } from "node:util";
import { gzipSync } from "node:zlib";
import { afterAll, beforeAll, describe, expect, it } from "vitest";
import { settingTable } from "../src/core/answer/settingTable.ts";
import { functionsMetadata } from "../src/functions/metadata.ts";

const run = promisify(execFile);
const root = join(import.meta.dirname, "..");
const dist = join(root, "dist");
const read = (path: string): Promise<string> => readFile(join(dist, path), "utf8");
/** What computes is in the worker, and in a script that is loaded where a page may not start workers. */
const scripts = ["functions.js", "inline.js", "pane.js", "worker.js"];

describe("the built add-in", () => {
  it("is these files and no more", () => {
    const files = readdirSync(dist).filter((name) => name !== "desk" && !name.startsWith("terminal"));
    const pages = ["functions.json", "help.html", "icons", "manifest.xml", "taskpane.html"];
    expect(files.sort()).toEqual([...pages, ...scripts].sort());
  });

  it("holds nothing of the desk's", async () => {
    for (const script of scripts)
      expect(await read(script), script).not.toMatch(/univer(?:js|_)|hucre|fflate|footing desk/i);
    expect(await read("desk/desk.js")).toMatch(/univer/i);
  });

  it("fits in 350 kB, zipped as it travels, without what computes", async () => {
    const sizes = await Promise.all(
      ["functions.js", "pane.js"].map(async (script) => gzipSync(await read(script)).length),
    );
    expect(sizes[0]! + sizes[1]!).toBeLessThan(350_000);
  });

  it("loads Excel's library in its head, then the functions, then the pane", async () => {
    const page = await read("taskpane.html");
    const sources = [...page.slice(0, page.indexOf("</head>")).matchAll(/<script[^>]* src="([^"]+)"/g)].map(
      ([, source]) => source,
    );
    expect(sources).toEqual(["https://appsforoffice.microsoft.com/lib/1/hosted/office.js", "functions.js", "pane.js"]);
  });

  it("may run no script and reach no host but its own and that of Excel's library", async () => {
    const rules = /http-equiv="Content-Security-Policy"\s+content="([^"]+)"/.exec(await read("taskpane.html"))![1]!;
    const hosts = [...rules.matchAll(/https?:\/\/[^\s;]+/g)].map(([host]) => host);
    expect(hosts).toEqual(["https://appsforoffice.microsoft.com"]);
    expect(rules).toContain("default-src 'none'");
    expect(rules).toContain("connect-src 'self'");
    expect(rules).not.toContain("unsafe-eval");
  });

  it("names no path of the machine it was built on", async () => {
    for (const script of [...scripts, "terminal.mjs", "desk/desk.js"])
      expect(await read(script), script).not.toContain(root);
  });
});

describe("the desk's pane", () => {
  it("is the add-in's page with another address for Excel's library", async () => {
    const [page, onDesk] = await Promise.all([read("taskpane.html"), read("desk/taskpane.html")]);
    const restored = onDesk
      .replace(/\s*<base href="..\/" \/>/, "")
      .replace("desk/office.js", "https://appsforoffice.microsoft.com/lib/1/hosted/office.js");
    expect(onDesk).not.toBe(page);
    expect(restored).toBe(page);
  });
});

describe("what Excel reads of the functions", () => {
  it("is the function table, and each help link leads to a part of the help page", async () => {
    const metadata = JSON.parse(await read("functions.json")) as ReturnType<typeof functionsMetadata>;
    const expected = JSON.stringify(functionsMetadata()).replaceAll("FOOTING_URL", "https://localhost:3000");
    expect(metadata).toEqual(JSON.parse(expected));
    const help = await read("help.html");
    for (const { helpUrl, name, parameters } of metadata.functions) {
      const anchor = /#(.+)$/.exec(helpUrl)![1]!;
      expect(help).toContain(`id="${anchor}"`);
      const part = help.slice(help.indexOf(`id="${anchor}"`)).split("</section>")[0]!;
      expect(part).toContain(`FOOTING.${name}`);
      for (const parameter of parameters) expect(part).toContain(`<dt>${parameter.name}</dt>`);
    }
    const settings = help.slice(help.indexOf('id="every-setting"')).split("</section>")[0]!;
    for (const { name } of settingTable) expect(settings).toContain(`<dt>${name}</dt>`);
    const ids = [...help.matchAll(/ id="([^"]+)"/g)].map(([, id]) => id);
    expect(new Set(ids).size).toBe(ids.length);
    for (const [, target] of help.matchAll(/ href="#([^"]+)"/g)) expect(ids).toContain(target);
  });
});

describe("a build for an address of its own", () => {
  const address = "https://footing.example.com/add-in";
  let folder = "";
  beforeAll(async () => {
    folder = await mkdtemp(join(tmpdir(), "footing-build-"));
    const webpack = join(root, "node_modules/webpack/bin/webpack.js");
    const options = ["--mode", "production", "--config-name", "add-in", "--output-path", folder];
    await run(process.execPath, [webpack, ...options], {
      cwd: root,
      env: { ...process.env, FOOTING_URL: `${address}/` },
    });
  });
  afterAll(() => rm(folder, { recursive: true }));

  it("puts it into the manifest and the help links, and leaves no stand-in for it", async () => {
    const manifest = await readFile(join(folder, "manifest.xml"), "utf8");
    expect(manifest).toContain(`<SourceLocation DefaultValue="${address}/taskpane.html" />`);
    const functions = await readFile(join(folder, "functions.json"), "utf8");
    expect(functions).toContain(`"helpUrl": "${address}/help.html#`);
    for (const text of [manifest.replace(/<!--.*?-->/gs, ""), functions])
      expect(text).not.toMatch(/FOOTING_URL|localhost/);
    expect(existsSync(join(folder, "icons/footing-80.png"))).toBe(true);
  });
});

describe("the built terminal program", () => {
  it("starts on Node alone", async () => {
    const text = await read("terminal.mjs");
    expect(text.startsWith("#!/usr/bin/env node\n")).toBe(true);
    const { stdout } = await run(process.execPath, [join(dist, "terminal.mjs"), "--help"]);
    expect(stdout).toContain("footing answer");
  });
});
