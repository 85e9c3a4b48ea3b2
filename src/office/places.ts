import type { DataPlace } from "../app/host.ts";
import { addressOf } from "../core/table/address.ts";
import { rectangleOf, whereabouts } from "./areas.ts";
import { sheetMark } from "./liveSheet.ts";
import { tablesOf } from "./tables.ts";

/** Tables, named ranges and sheets that hold data, in the order a user looks for them. */
export async function listPlaces(context: Excel.RequestContext): Promise<readonly DataPlace[]> {
  const { worksheets, names } = context.workbook;
  worksheets.load("items/name,items/visibility");
  names.load("items/name,items/type,items/visible");
  const tables = await tablesOf(context.workbook);
  const visible = worksheets.items.filter(({ visibility }) => visibility === "Visible");
  const used = visible.map((sheet) => sheet.getUsedRangeOrNullObject(true).load(`${whereabouts},worksheet/name`));
  const local = visible.map((sheet) => ({
    own: sheet.names.load("items/name,items/type,items/visible"),
    mark: sheet.customProperties.getItemOrNullObject(sheetMark.key).load("value"),
  }));
  await context.sync();
  // Names on sheets that Footing wrote are headings, not data.
  const ofOthers = local.filter(({ mark }) => mark.isNullObject).map(({ own }) => own);
  const items = [names, ...ofOthers].flatMap((collection) => collection.items).filter(isOffered);
  const ranges = items.map((item) => item.getRangeOrNullObject().load(`${whereabouts},worksheet/name`));
  if (ranges.length > 0) await context.sync();
  return [
    ...tables.map(({ name, sheet, data }): DataPlace => ({
      kind: "table",
      name,
      address: addressOf({ ...data, sheet }),
    })),
    ...items.flatMap(({ name }, index) => placesAt("name", ranges[index]!, name)),
    ...used.flatMap((range) => (range.isNullObject ? [] : placesAt("sheet", range, range.worksheet.name))),
  ];
}

/** Excel keeps names of its own for print areas and filters. */
const isOffered = ({ name, type, visible }: Excel.NamedItem): boolean =>
  type === "Range" && visible && !/^_|^Print_(Area|Titles)$/.test(name);

const placesAt = (kind: DataPlace["kind"], range: Excel.Range, name: string): DataPlace[] =>
  range.isNullObject
    ? []
    : [{ kind, name, address: addressOf({ ...rectangleOf(range), sheet: range.worksheet.name }) }];
