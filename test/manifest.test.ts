import { readFile } from "node:fs/promises";
import { describe, expect, it } from "vitest";
import { everyElement, parseXml, type Element } from "./support/xmlTree.ts";

const read = (path: string): Promise<Buffer> => readFile(new URL(`../${path}`, import.meta.url));

const address = "https://footing.example.com";
const manifest = parseXml((await read("manifest.xml")).toString().replaceAll("FOOTING_URL", address));
const elements = [...everyElement(manifest)];
const named = (name: string): readonly Element[] => elements.filter((element) => element.name === name);
const names = ({ children }: Element): readonly string[] => children.map(({ name }) => name);
const only = (name: string): Element => {
  const found = named(name);
  expect(found, name).toHaveLength(1);
  return found[0]!;
};
const valueOf = (name: string): string => only(name).attributes["DefaultValue"] ?? "";

const resources = new Map(
  ["bt:Image", "bt:Url", "bt:String"].flatMap((name) =>
    named(name).flatMap(({ attributes }) =>
      attributes["id"] === undefined ? [] : [[attributes["id"], attributes["DefaultValue"] ?? ""] as const],
    ),
  ),
);
const resourcesIn = (group: string): readonly string[] =>
  only(group).children.map(({ attributes }) => attributes["DefaultValue"] ?? "");

describe("the manifest", () => {
  it("has its elements in the order that the platform asks for", () => {
    expect(names(manifest)).toEqual([
      ...["Id", "Version", "ProviderName", "DefaultLocale", "DisplayName", "Description", "IconUrl"],
      ...["HighResolutionIconUrl", "SupportUrl", "Hosts", "Requirements", "DefaultSettings", "Permissions"],
      "VersionOverrides",
    ]);
    const overrides = only("VersionOverrides");
    expect(names(overrides)).toEqual(["Hosts", "Resources"]);
    expect(names(overrides.children[0]!.children[0]!)).toEqual(["Runtimes", "AllFormFactors", "DesktopFormFactor"]);
    expect(names(only("Resources"))).toEqual(["bt:Images", "bt:Urls", "bt:ShortStrings", "bt:LongStrings"]);
    expect(names(only("DesktopFormFactor"))).toEqual(["GetStarted", "FunctionFile", "ExtensionPoint"]);
    expect(names(only("GetStarted"))).toEqual(["Title", "Description", "LearnMoreUrl"]);
    expect(names(only("Group"))).toEqual(["Label", "Icon", "Control"]);
    expect(names(only("Control"))).toEqual(["Label", "Supertip", "Icon", "Action"]);
  });

  it("is known by a GUID and a version of at most four numbers, the package's own", async () => {
    expect(only("Id").text).toMatch(/^[0-9a-f]{8}-[0-9a-f]{4}-4[0-9a-f]{3}-[89ab][0-9a-f]{3}-[0-9a-f]{12}$/);
    expect(only("Version").text).toMatch(/^\d{1,5}(?:\.\d{1,5}){0,3}$/);
    const { version } = JSON.parse((await read("package.json")).toString()) as { version: string };
    expect(only("Version").text).toBe(version);
  });

  it("keeps to the lengths of its texts", () => {
    expect(valueOf("DisplayName").length).toBeLessThanOrEqual(125);
    expect(only("ProviderName").text.length).toBeLessThanOrEqual(125);
    const descriptions = manifest.children.filter(({ name }) => name === "Description");
    expect(descriptions[0]!.attributes["DefaultValue"]!.length).toBeLessThanOrEqual(250);
    resourcesIn("bt:ShortStrings").forEach((text) => expect(text.length, text).toBeLessThanOrEqual(125));
    resourcesIn("bt:LongStrings").forEach((text) => expect(text.length, text).toBeLessThanOrEqual(250));
    resources.forEach((text) => expect(text).not.toBe(""));
  });

  it("refers only to resources that exist, and holds none that nobody uses", () => {
    const used = elements.flatMap(({ attributes }) => attributes["resid"] ?? []);
    used.forEach((id) => expect([...resources.keys()], id).toContain(id));
    expect([...new Set(used)].sort()).toEqual([...resources.keys()].sort());
    [...resources.keys()].forEach((id) => expect(id.length).toBeLessThanOrEqual(32));
    const ids = [...named("Group"), ...named("Control")].map(({ attributes }) => attributes["id"]);
    expect(new Set(ids).size).toBe(ids.length);
  });

  it("has only https addresses, each a file that the build makes", () => {
    const addresses = [
      ...["IconUrl", "HighResolutionIconUrl", "SupportUrl"].map(valueOf),
      ...resourcesIn("bt:Urls"),
      ...resourcesIn("bt:Images"),
      ...named("SourceLocation").flatMap(({ attributes }) => attributes["DefaultValue"] ?? []),
    ];
    expect(addresses).toHaveLength(16);
    for (const one of addresses) {
      expect(one.startsWith(`${address}/`), one).toBe(true);
      expect(one.length).toBeLessThanOrEqual(2048);
      expect(one.slice(address.length)).toMatch(
        /^\/(?:taskpane\.html|functions\.js|functions\.json|help\.html|icons\/footing-\d+\.png)$/,
      );
    }
  });
});

describe("the shared runtime", () => {
  it("is one page for pane, functions and commands, alive as long as the workbook", () => {
    expect(only("Runtime").attributes).toEqual({ resid: "Pane.Url", lifetime: "long" });
    const page = only("Page").children[0]!;
    const shown = only("Action").children[0]!;
    const pages = [only("FunctionFile"), page, shown].map(({ attributes }) => attributes["resid"]);
    expect(pages).toEqual(["Pane.Url", "Pane.Url", "Pane.Url"]);
    expect(only("Action").attributes["xsi:type"]).toBe("ShowTaskpane");
    expect(named("TaskpaneId")).toEqual([]);
  });

  it("is asked for once, where every button would vanish if it were asked for elsewhere", () => {
    expect(named("Requirements")).toHaveLength(1);
    expect(names(manifest)).toContain("Requirements");
    expect(only("Set").attributes).toEqual({ Name: "SharedRuntime", MinVersion: "1.1" });
  });

  it("carries functions of the namespace FOOTING, their code and metadata apart", () => {
    const [script, metadata] = ["Script", "Metadata"].map((name) => only(name).children[0]!.attributes["resid"] ?? "");
    expect(resources.get(script!)).toBe(`${address}/functions.js`);
    expect(resources.get(metadata!)).toBe(`${address}/functions.json`);
    expect(resources.get(only("Namespace").attributes["resid"] ?? "")).toBe("FOOTING");
  });

  it("needs the one permission without which Excel's API does not work, and no other site", () => {
    expect(only("Permissions").text).toBe("ReadWriteDocument");
    expect(named("AppDomain")).toEqual([]);
    expect(named("Host").map(({ attributes }) => attributes["Name"] ?? attributes["xsi:type"])).toEqual([
      "Workbook",
      "Workbook",
    ]);
  });
});

describe("the icons", () => {
  it("of group and button come in every size that is asked for, each picture of its own size", async () => {
    for (const icon of named("Icon")) {
      const sizes = icon.children.map(({ attributes }) => Number(attributes["size"]));
      expect(sizes).toEqual([16, 20, 24, 32, 40, 48, 64, 80]);
      for (const { attributes } of icon.children) {
        expect(await sizeOf(resources.get(attributes["resid"]!)!)).toEqual(Array(2).fill(Number(attributes["size"])));
      }
    }
  });

  it("of the add-in list are 32 and 64 pixels", async () => {
    expect(await sizeOf(valueOf("IconUrl"))).toEqual([32, 32]);
    expect(await sizeOf(valueOf("HighResolutionIconUrl"))).toEqual([64, 64]);
  });
});

const pngSign = Buffer.from([0x89, 0x50, 0x4e, 0x47, 0x0d, 0x0a, 0x1a, 0x0a]);

/** Width and height as the picture file itself says. */
async function sizeOf(url: string): Promise<readonly number[]> {
  const file = await read(url.replace(address, "assets"));
  expect(file.subarray(0, 8).equals(pngSign)).toBe(true);
  return [file.readUInt32BE(16), file.readUInt32BE(20)];
}
