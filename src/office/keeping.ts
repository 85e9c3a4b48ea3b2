import { type KeptPart, type ResultSheet, namePrefix } from "../app/keeper.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { addressOf, parseAddress } from "../core/table/address.ts";
import { rectangleOf, whereabouts } from "./areas.ts";
import { sheetMark } from "./liveSheet.ts";
import { sheetNamed, unknownSheet } from "./locate.ts";
import { rangeAt } from "./writeCells.ts";

/** The parts of a namespace, in two trips. */
export async function readParts(context: Excel.RequestContext, namespace: string): Promise<readonly KeptPart[]> {
  const parts = context.workbook.customXmlParts.getByNamespace(namespace);
  parts.load("items/id");
  await context.sync();
  const texts = parts.items.map((part) => part.getXml());
  if (texts.length > 0) await context.sync();
  return parts.items.map(({ id }, index) => ({ id, xml: texts[index]!.value }));
}

export async function writePart(context: Excel.RequestContext, id: string | null, xml: string): Promise<Result<null>> {
  const { customXmlParts } = context.workbook;
  if (id === null) customXmlParts.add(xml);
  else customXmlParts.getItem(id).setXml(xml);
  await context.sync();
  return success(null);
}

const about = "The data of what Footing keeps in this workbook. Change it if they have moved.";

/** Names the cells for good: in three trips, the last where they had no name yet. */
export async function nameCells(
  context: Excel.RequestContext,
  address: string,
): Promise<Result<{ readonly name: string }>> {
  const area = parseAddress(address);
  if (area === null) return failure({ code: "bad-address", address });
  const sheet = sheetNamed(context, area.sheet).load("name");
  const { names } = context.workbook;
  names.load("items/name");
  await context.sync();
  if (sheet.isNullObject) return unknownSheet(context, area.sheet);
  const own = names.items.filter(({ name }) => name.startsWith(namePrefix));
  const ranges = own.map((item) => item.getRangeOrNullObject().load(`${whereabouts},worksheet/name`));
  if (own.length > 0) await context.sync();
  const wanted = addressOf(area);
  const known = own.find((_, index) => placeOf(ranges[index]!) === wanted);
  if (known !== undefined) return success({ name: known.name });
  const name = freeName(names.items.map((item) => item.name));
  names.add(name, rangeAt(sheet, area), about);
  await context.sync();
  return success({ name });
}

/** null where the cells of a name are gone. */
const placeOf = (range: Excel.Range): string | null =>
  range.isNullObject ? null : addressOf({ ...rectangleOf(range), sheet: range.worksheet.name });

function freeName(taken: readonly string[]): string {
  const used = new Set(taken.map((name) => name.toLowerCase()));
  for (let number = 1; ; number++) {
    const name = `${namePrefix}${number}`;
    if (!used.has(name.toLowerCase())) return name;
  }
}

export async function forgetName(context: Excel.RequestContext, name: string): Promise<Result<null>> {
  if (!name.startsWith(namePrefix)) return success(null);
  const item = context.workbook.names.getItemOrNullObject(name).load("name");
  await context.sync();
  if (!item.isNullObject) item.delete();
  await context.sync();
  return success(null);
}

/** Stands beside the mark of a result sheet, and names what is known of it. */
const recordKey = "FootingRecord";

export async function resultSheets(context: Excel.RequestContext): Promise<readonly ResultSheet[]> {
  const { worksheets } = context.workbook;
  worksheets.load("items/name");
  await context.sync();
  const found = worksheets.items.map(({ name, customProperties }) => ({
    sheet: name,
    mark: customProperties.getItemOrNullObject(sheetMark.key).load("value"),
    record: customProperties.getItemOrNullObject(recordKey).load("value"),
  }));
  await context.sync();
  return found
    .filter(({ mark }) => !mark.isNullObject && mark.value === sheetMark.value)
    .map(({ sheet, record }) => ({ sheet, record: record.isNullObject ? null : record.value }));
}

export async function tagSheet(context: Excel.RequestContext, name: string, record: string): Promise<Result<null>> {
  const sheet = sheetNamed(context, name).load("name");
  await context.sync();
  if (sheet.isNullObject) return unknownSheet(context, name);
  sheet.customProperties.add(recordKey, record);
  await context.sync();
  return success(null);
}
