import type { BookData, SheetData } from "../book/bookData.ts";
import { partOf, partsMatching, textOf, type Parts } from "./parts.ts";
import { appendTo, escapeXml, unescapeXml } from "./xmlText.ts";

/** What add-ins keep in a workbook, beside its cells. */
export interface Kept {
  readonly customXml: NonNullable<BookData["customXml"]>;
  readonly settings: Readonly<Record<string, unknown>>;
  /** By sheet name. */
  readonly customProperties: Readonly<Record<string, NonNullable<SheetData["customProperties"]>>>;
}

/** The part in which the desk keeps what Excel keeps in parts of many kinds: settings, and the marks of sheets. */
const deskNamespace = "urn:footing:desk";
const deskId = "{5D2C3B63-6E0B-4A43-9C0E-2B7E1C7E8C11}";
const deskPattern = new RegExp(`^<desk xmlns="${deskNamespace}">(.*)</desk>$`, "s");

export function keptOf(book: BookData): Kept {
  const marked = book.sheets.filter(({ customProperties = {} }) => Object.keys(customProperties).length > 0);
  return {
    customXml: book.customXml ?? [],
    settings: book.settings ?? {},
    customProperties: Object.fromEntries(marked.map(({ name, customProperties = {} }) => [name, customProperties])),
  };
}

const relationships = "http://schemas.openxmlformats.org/officeDocument/2006/relationships";
const packageTypes = "http://schemas.openxmlformats.org/package/2006/relationships";
const propertiesType = "application/vnd.openxmlformats-officedocument.customXmlProperties+xml";

/** The parts of the file with what add-ins keep among them. */
export function withKept(parts: Parts, kept: Kept): Parts {
  const items = [...kept.customXml, ...deskItem(kept)];
  if (items.length === 0) return parts;
  const added = items.flatMap(({ id, xml }, index) => itemParts(id, xml, index + 1));
  const links = items.map((_, index) =>
    relationship(`kept${index + 1}`, "customXml", `../customXml/item${index + 1}.xml`),
  );
  const types = items.map(
    (_, index) => `<Override PartName="/customXml/itemProps${index + 1}.xml" ContentType="${propertiesType}"/>`,
  );
  return {
    ...parts,
    ...Object.fromEntries(added.map(([path, text]) => [path, partOf(text)])),
    "xl/_rels/workbook.xml.rels": extended(parts["xl/_rels/workbook.xml.rels"]!, "Relationships", links.join("")),
    "[Content_Types].xml": extended(parts["[Content_Types].xml"]!, "Types", types.join("")),
  };
}

function deskItem({ settings, customProperties }: Kept): Kept["customXml"] {
  if (Object.keys({ ...settings, ...customProperties }).length === 0) return [];
  const json = escapeXml(JSON.stringify({ settings, customProperties }));
  return [{ id: deskId, xml: `<desk xmlns="${deskNamespace}">${json}</desk>` }];
}

function itemParts(id: string, xml: string, number: number): readonly (readonly [string, string])[] {
  const properties = `<ds:datastoreItem ds:itemID="${escapeXml(id)}" xmlns:ds="http://schemas.openxmlformats.org/officeDocument/2006/customXml"/>`;
  const link = relationship("rId1", "customXmlProps", `itemProps${number}.xml`);
  return [
    [`customXml/item${number}.xml`, xml],
    [`customXml/itemProps${number}.xml`, `<?xml version="1.0" encoding="UTF-8" standalone="no"?>${properties}`],
    [`customXml/_rels/item${number}.xml.rels`, `<Relationships xmlns="${packageTypes}">${link}</Relationships>`],
  ];
}

const relationship = (id: string, type: string, target: string): string =>
  `<Relationship Id="${id}" Type="${relationships}/${type}" Target="${target}"/>`;

const extended = (part: Uint8Array, list: string, children: string): Uint8Array =>
  partOf(appendTo(textOf(part), list, children) ?? textOf(part));

/** What add-ins kept in a workbook file, also one that Excel saved. */
export function readKept(bytes: Uint8Array): Kept {
  const parts = partsMatching(bytes, /^customXml\/item(?:Props)?\d+\.xml$/);
  const items = Object.keys(parts).flatMap((path) => {
    const number = /item(\d+)\.xml$/.exec(path)?.[1];
    if (number === undefined) return [];
    const properties = parts[`customXml/itemProps${number}.xml`];
    const id = properties && /itemID="([^"]*)"/.exec(textOf(properties))?.[1];
    return [{ id: id ?? `{item-${number}}`, xml: textOf(parts[path]!) }];
  });
  const desk = items.map(({ xml }) => deskPattern.exec(xml)?.[1]).find((json) => json !== undefined);
  const kept = desk === undefined ? {} : (JSON.parse(unescapeXml(desk)) as Partial<Kept>);
  return {
    customXml: items.filter(({ xml }) => !deskPattern.test(xml)),
    settings: kept.settings ?? {},
    customProperties: kept.customProperties ?? {},
  };
}
