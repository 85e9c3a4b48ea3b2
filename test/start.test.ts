import { spawn, type ChildProcess } from "node:child_process";
import { join } from "node:path";
import { afterAll, beforeAll, describe, expect, it } from "vitest";

const root = join(import.meta.dirname, "..");
const patience = 240_000;

let server: ChildProcess;
let address = "";

beforeAll(async () => {
  const webpack = join(root, "node_modules/webpack/bin/webpack.js");
  server = spawn(process.execPath, [webpack, "serve", "--mode", "development"], { cwd: root });
  address = await printedAddress(server);
}, patience);
afterAll(() => server.kill());

/** The address of the desk as the server prints it for a reader. */
function printedAddress({ stdout, stderr }: ChildProcess): Promise<string> {
  return new Promise((resolve, reject) => {
    let printed = "";
    const read = (chunk: Buffer): void => {
      printed += chunk.toString();
      const found = /The desk with the demo workbook:\s+(http:\/\/localhost:\d+)\/desk\//.exec(printed);
      if (found !== null) resolve(found[1]!);
    };
    stdout?.on("data", read);
    stderr?.on("data", read);
    stdout?.on("end", () => reject(new Error(printed)));
  });
}

describe("npm start", () => {
  it.each([
    ["/desk/", "<title>Footing: the desk</title>"],
    ["/desk/desk.js", "Kestrel"],
    ["/desk/taskpane.html", "desk/office.js"],
    ["/desk/vendor/excel-win32-16.01.debug.js", "_richApiNativeBridge"],
    ["/taskpane.html", "appsforoffice.microsoft.com"],
    ["/functions.json", '"functions"'],
    ["/manifest.xml", "<DisplayName"],
  ])(
    "serves %s",
    async (path, content) => {
      const answer = await fetch(address + path);
      expect(answer.status).toBe(200);
      expect(await answer.text()).toContain(content);
    },
    patience,
  );

  it("leads from its root to the desk", async () => {
    const answer = await fetch(`${address}/`, { redirect: "manual" });
    expect([answer.status, answer.headers.get("location")]).toEqual([302, "/desk/"]);
  });
});
