import { partOf, textOf, type Parts } from "./parts.ts";

/** Parts on their way into another workbook, under names of their own. */
export interface Carried {
  readonly parts: Parts;
  /** Paths of the sheets among them, in order. */
  readonly sheets: readonly string[];
}

interface Marks {
  /** Added to the style number of each cell. */
  readonly styleShift: number;
  /** The mark of spilling formulas; null takes it away. */
  readonly spillMark: number | null;
}

const folders = /^xl\/(?:worksheets|drawings|charts|tables)\//;
const fileName = /[^/]+$/;

/** The sheets, drawings, charts and tables of one workbook, renamed and renumbered to live in another. */
export function carriedParts(from: Parts, into: Parts, marks: Marks): Carried {
  const prefix = freePrefix(into);
  const shiftTables = highestTable(into);
  const renamed = Object.entries(from)
    .filter(([path]) => folders.test(path))
    .map(([path, part]) => [
      renamedPath(path, prefix),
      partOf(adapted(path, textOf(part), { ...marks, prefix, shiftTables })),
    ]);
  const sheets = Object.keys(from)
    .filter((path) => sheetPath.test(path))
    .sort(bySheetNumber);
  return { parts: Object.fromEntries(renamed) as Parts, sheets: sheets.map((path) => renamedPath(path, prefix)) };
}

const sheetPath = /^xl\/worksheets\/sheet(\d+)\.xml$/;
const bySheetNumber = (first: string, second: string): number =>
  Number(sheetPath.exec(first)?.[1]) - Number(sheetPath.exec(second)?.[1]);

const renamedPath = (path: string, prefix: string): string => path.replace(fileName, (name) => prefix + name);

function freePrefix(into: Parts): string {
  const names = Object.keys(into).map((path) => fileName.exec(path)?.[0] ?? "");
  const free = (number: number): string =>
    names.some((name) => name.startsWith(`footing${number}-`)) ? free(number + 1) : `footing${number}-`;
  return free(1);
}

const tableNumber = /<(?:\w+:)?table [^>]*?\bid="(\d+)"/;

function highestTable(into: Parts): number {
  const tables = Object.entries(into).filter(([path]) => /^xl\/tables\/[^/]+\.xml$/.test(path));
  return Math.max(0, ...tables.map(([, part]) => Number(tableNumber.exec(textOf(part))?.[1] ?? 0)));
}

function adapted(path: string, part: string, changes: Marks & { prefix: string; shiftTables: number }): string {
  if (path.endsWith(".rels")) {
    return part.replace(/(Target="\.\.\/(?:drawings|charts|tables)\/)/g, `$1${changes.prefix}`);
  }
  if (path.startsWith("xl/tables/")) {
    return part.replace(
      /(<table [^>]*?\bid=")(\d+)"/,
      (_, start: string, id: string) => `${start}${Number(id) + changes.shiftTables}"`,
    );
  }
  return path.startsWith("xl/worksheets/") ? adaptedSheet(part, changes) : part;
}

function adaptedSheet(part: string, { styleShift, spillMark }: Marks): string {
  const mark = spillMark === null ? "" : ` cm="${spillMark}"`;
  return part
    .replace(
      /(<c [^>]*?\bs="|<col [^>]*?\bstyle=")(\d+)"/g,
      (_, start: string, style: string) => `${start}${Number(style) + styleShift}"`,
    )
    .replace(/(<c [^>]*?) cm="\d+"/g, (_, start: string) => start + mark);
}
