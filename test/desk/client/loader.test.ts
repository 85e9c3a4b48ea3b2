import { describe, expect, it } from "vitest";
import { darkTheme, installLoader, type Globals } from "../../../src/desk/client/loader.ts";
import { isSetSupported, withExcelApi } from "../../../src/desk/client/requirementSets.ts";
import { joinedTransports } from "../../../src/desk/client/transport.ts";

const page = (): { Office: typeof Office; globals: Globals } => {
  const globals: Globals = {};
  installLoader(globals, joinedTransports().client, { theme: darkTheme, platform: "PC" });
  return { Office: globals["Office"] as typeof Office, globals };
};

describe("the stand-in for the loader", () => {
  it("is ready with Excel as its host, by callback and by promise", async () => {
    const { Office } = page();
    const heard: unknown[] = [];
    await Office.onReady((info) => heard.push(info.host));
    expect([...heard, (await Office.onReady()).platform]).toEqual(["Excel", "PC"]);
  });

  it("tells the theme and the requirement sets", () => {
    const { context } = page().Office;
    expect(context.officeTheme.bodyBackgroundColor).toBe(darkTheme.bodyBackgroundColor);
    expect(context.requirements.isSetSupported("ExcelApi", "1.12")).toBe(true);
    expect(context.requirements.isSetSupported("excelapi", "1.4")).toBe(true);
    expect(context.requirements.isSetSupported("ExcelApi", "1.13")).toBe(false);
    expect(context.requirements.isSetSupported("WordApi", "1.1")).toBe(false);
  });

  it("can stand for an older host", () => {
    expect(isSetSupported("ExcelApi", "1.9", withExcelApi("1.8"))).toBe(false);
    expect(isSetSupported("ExcelApi", "1.8", withExcelApi("1.8"))).toBe(true);
  });

  it("keeps functions by their ids, without regard to case", () => {
    const { CustomFunctions } = page().globals as {
      CustomFunctions: {
        associate: (id: string, work: unknown) => void;
        _association: { mappings: Record<string, unknown> };
      };
    };
    const work = (): number => 1;
    CustomFunctions.associate("answer", work);
    expect(CustomFunctions._association.mappings).toEqual({ ANSWER: work });
  });
});
