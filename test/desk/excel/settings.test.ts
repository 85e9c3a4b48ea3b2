import { afterAll, beforeAll, expect, it } from "vitest";
import type { NodeDesk } from "../../../src/desk/client/openDesk.ts";
import { codeOf, testDesk } from "../../support/desk.ts";

let desk: NodeDesk;
beforeAll(async () => {
  desk = await testDesk();
});
afterAll(() => desk.close());

const xml = (text: string): string => `<model xmlns="https://footing.example/model">${text}</model>`;

it("keeps settings by key", async () => {
  const read = await desk.Excel.run(async (context) => {
    const { settings } = context.workbook;
    settings.add("level", { value: 0.05 });
    settings.add("level", { value: 0.1 });
    const kept = settings.getItem("level");
    const none = settings.getItemOrNullObject("none");
    kept.load("value");
    await context.sync();
    return [kept.value as unknown, none.isNullObject];
  });
  expect(read).toEqual([{ value: 0.1 }, true]);
  expect(desk.snapshot().settings).toEqual({ level: { value: 0.1 } });
});

it("keeps custom XML parts by id and namespace", async () => {
  const read = await desk.Excel.run(async (context) => {
    const { customXmlParts } = context.workbook;
    const part = customXmlParts.add(xml("one"));
    customXmlParts.add("<other/>");
    part.load("id,namespaceUri");
    await context.sync();
    const found = customXmlParts.getByNamespace("https://footing.example/model").getOnlyItemOrNullObject();
    found.load("id");
    await context.sync();
    found.setXml(xml("two"));
    const text = customXmlParts.getItem(part.id).getXml();
    await context.sync();
    return [part.namespaceUri, found.id === part.id, text.value];
  });
  expect(read).toEqual(["https://footing.example/model", true, xml("two")]);
  expect(desk.snapshot().customXml?.map((part) => part.xml)).toEqual([xml("two"), "<other/>"]);
});

it("refuses text that is no XML", async () => {
  const code = await codeOf(() =>
    desk.Excel.run(async (context) => {
      context.workbook.customXmlParts.add("no element");
      await context.sync();
    }),
  );
  expect(code).toBe("InvalidArgument");
});

it("tells the application's ways", async () => {
  const told = await desk.Excel.run(async (context) => {
    const { application } = context.workbook;
    application.load("calculationState,calculationMode,decimalSeparator");
    application.cultureInfo.load("name");
    application.suspendScreenUpdatingUntilNextSync();
    application.suspendApiCalculationUntilNextSync();
    await context.sync();
    return [application.calculationState, application.decimalSeparator, application.cultureInfo.name];
  });
  expect(told).toEqual(["Done", ".", "en-US"]);
});
