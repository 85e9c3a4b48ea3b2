import type { CarriedSheets, SheetData } from "../book/bookData.ts";
import type { Carried } from "./carriedParts.ts";
import { withHiddenSpillNames } from "./elements/spillNames.ts";
import { partOf, textOf, type Parts } from "./parts.ts";
import { appendTo, countOf, escapeXml, insideOf, prefixOf, withPrefix } from "./xmlText.ts";

const contents = "[Content_Types].xml";
const workbook = "xl/workbook.xml";
const links = "xl/_rels/workbook.xml.rels";

const officeTypes = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";

/** Tells a workbook of the sheets that were put among its parts. */
export function registerSheets(parts: Parts, added: CarriedSheets, carried: Carried): Parts {
  const { sheets } = added;
  const ids = carried.sheets.map(
    (_, index) => `footing${countOf(textOf(parts[links]!), "(?:\\w+:)?Relationship") + index + 1}`,
  );
  return {
    ...parts,
    [contents]: partOf(withTypes(textOf(parts[contents]!), carried)),
    [links]: partOf(withLinks(textOf(parts[links]!), carried, ids)),
    [workbook]: partOf(withNames(withEntries(textOf(parts[workbook]!), sheets, ids), added)),
  };
}

const contentTypes: readonly (readonly [RegExp, string])[] = [
  [/^xl\/worksheets\/[^/]+\.xml$/, "application/vnd.openxmlformats-officedocument.spreadsheetml.worksheet+xml"],
  [/^xl\/tables\/[^/]+\.xml$/, "application/vnd.openxmlformats-officedocument.spreadsheetml.table+xml"],
  [/^xl\/drawings\/[^/]+\.xml$/, "application/vnd.openxmlformats-officedocument.drawing+xml"],
  [/^xl\/charts\/[^/]+\.xml$/, "application/vnd.openxmlformats-officedocument.drawingml.chart+xml"],
  [/^xl\/metadata\.xml$/, "application/vnd.openxmlformats-officedocument.spreadsheetml.sheetMetadata+xml"],
  [/^xl\/styles\.xml$/, "application/vnd.openxmlformats-officedocument.spreadsheetml.styles+xml"],
];

function withTypes(part: string, { parts }: Carried): string {
  const overrides = Object.keys(parts).flatMap((path) => {
    const type = contentTypes.find(([pattern]) => pattern.test(path))?.[1];
    return type === undefined ? [] : [`<Override PartName="/${path}" ContentType="${type}"/>`];
  });
  return appended(part, "Types", overrides.join(""));
}

function withLinks(part: string, { parts, sheets }: Carried, ids: readonly string[]): string {
  const link = (id: string, type: string, target: string): string =>
    `<Relationship Id="${id}" Type="${officeTypes}/${type}" Target="${target}"/>`;
  const own = sheets.map((path, index) => link(ids[index]!, "worksheet", path.replace(/^xl\//, "")));
  const single = singleParts.filter(({ path }) => path in parts);
  const further = single.map(({ path, type }) => link(`footing-${type}`, type, path.replace(/^xl\//, "")));
  return appended(part, "Relationships", [...own, ...further].join(""));
}

/** Parts of which a workbook has one, linked to it directly. */
const singleParts = [
  { path: "xl/styles.xml", type: "styles" },
  { path: "xl/metadata.xml", type: "sheetMetadata" },
];

function withEntries(part: string, sheets: readonly SheetData[], ids: readonly string[]): string {
  const used = [...part.matchAll(/sheetId="(\d+)"/g)].map(([, id]) => Number(id));
  const next = Math.max(0, ...used) + 1;
  const entries = sheets.map(
    ({ name }, index) =>
      `<sheet name="${escapeXml(name)}" sheetId="${next + index}" xmlns:r="${officeTypes}" r:id="${ids[index]}"/>`,
  );
  return appended(part, "sheets", entries.join(""));
}

/** A name that belongs to a sheet goes by the sheet's place among all of them. */
function withNames(part: string, { sheets, names }: CarriedSheets): string {
  const prefix = prefixOf(part);
  const first = countOf(insideOf(part, `${prefix}sheets`), `${prefix}sheet`) - sheets.length;
  const entries = sheets.flatMap((sheet, index) =>
    [...printed(sheet), ...names.filter((name) => name.sheet === sheet.name)].map(
      ({ name, refersTo, comment = "" }) =>
        `<definedName name="${escapeXml(name)}"${comment && ` comment="${escapeXml(comment)}"`} localSheetId="${first + index}">${escapeXml(refersTo)}</definedName>`,
    ),
  );
  if (entries.length === 0) return part;
  const children = withPrefix(withHiddenSpillNames(entries.join("")), prefix);
  return appendTo(part, `${prefix}definedNames`, children) ?? afterSheets(part, prefix, children);
}

/** What is to be printed is such a name too. */
function printed({ name, printArea }: SheetData): CarriedSheets["names"] {
  if (printArea === null) return [];
  const area = printArea.replace(/\$?([A-Z]+)\$?(\d+)/g, "$$$1$$$2");
  return [{ name: "_xlnm.Print_Area", refersTo: `'${name.replaceAll("'", "''")}'!${area}` }];
}

/** A workbook without names: their list follows that of the sheets, of function groups and of outside links. */
function afterSheets(part: string, prefix: string, names: string): string {
  const list = `<${prefix}definedNames>${names}</${prefix}definedNames>`;
  const before = ["externalReferences", "functionGroups", "sheets"].map((element) => `</${prefix}${element}>`);
  const last = before.find((end) => part.includes(end)) ?? "";
  return part.replace(last, last + list);
}

function appended(part: string, list: string, children: string): string {
  const prefix = prefixOf(part);
  return appendTo(part, prefix + list, withPrefix(children, prefix)) ?? part;
}
