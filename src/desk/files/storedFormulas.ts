import { bracketed } from "../workbook/structuredReferences.ts";
import { futureFunctions, worksheetOnly } from "./futureFunctions.ts";

/** How Excel stores the functions of an add-in whose namespace is FOOTING. */
const storedAddIn = "_xldudf_FOOTING_";
const shownAddIn = "FOOTING.";

/**
 * A formula as a file holds it: without "=", add-in functions as _xldudf_FOOTING_ANSWER(...), younger functions
 * with their prefix, a spilled range A1# as ANCHORARRAY(A1), and [@Price] as Sales[[#This Row],[Price]].
 * @param inTable - the table that the formula stands in, empty for none.
 */
export function toStored(formula: string, inTable = ""): string {
  return outsideQuotes(withAnchors(withThisRow(formula.replace(/^=/, ""), inTable)), (code) =>
    code.replace(/(?<![\w.])([A-Z][A-Z0-9.]*)(?=\()/gi, storedName),
  );
}

/** Text, columns of tables and names of sheets; or a cell, with the sheet that it stands on where one is named. */
const textOr = (cell: (reference: string) => string): RegExp =>
  new RegExp(
    [
      String.raw`"(?:[^"]|"")*"`,
      bracketed,
      cell(String.raw`((?:'(?:[^']|'')+'!|[\p{L}_][\p{L}\p{N}_.]*!)?\$?[A-Z]{1,3}\$?\d{1,7})`),
      String.raw`'(?:[^']|'')*'`,
    ].join("|"),
    "giu",
  );

const spilledCell = textOr((reference) => String.raw`(?<![\p{L}\p{N}_.'!])${reference}#`);
const anchoredCell = textOr((reference) => String.raw`ANCHORARRAY\(${reference}\)`);

const withAnchors = (formula: string): string =>
  formula.replaceAll(spilledCell, (whole: string, cell?: string) =>
    cell === undefined ? whole : `ANCHORARRAY(${cell})`,
  );

const withoutAnchors = (formula: string): string =>
  formula.replaceAll(anchoredCell, (whole: string, cell?: string) => (cell === undefined ? whole : `${cell}#`));

function storedName(name: string): string {
  const upper = name.toUpperCase();
  if (upper.startsWith(shownAddIn)) return storedAddIn + upper.slice(shownAddIn.length).replaceAll(".", "_");
  if (worksheetOnly.has(upper)) return `_xlfn._xlws.${upper}`;
  return futureFunctions.has(upper) ? `_xlfn.${upper}` : name;
}

const columnsSpoken = new RegExp(
  String.raw`"(?:[^"]|"")*"|'(?:[^']|'')*'|([\p{L}_\\][\p{L}\p{N}_.\\]*)?(${bracketed})(?![\p{L}\p{N}_'!])`,
  "gu",
);

/** Files know neither the sign for a formula's own row nor a column whose table goes without saying. */
const withThisRow = (formula: string, inTable: string): string =>
  formula.replaceAll(columnsSpoken, (whole: string, called?: string, brackets?: string) => {
    const table = called ?? inTable;
    if (brackets === undefined || table === "") return whole;
    return table + (brackets.startsWith("[@") ? thisRow(brackets.slice(2, -1)) : brackets);
  });

const thisRow = (columns: string): string =>
  columns === "" ? "[#This Row]" : `[[#This Row],${columns.startsWith("[") ? columns : `[${columns}]`}]`;

/**
 * The same formula as people write it, with its "=". Functions that came after the file format stand in capitals: LibreOffice
 * saves those that it does not know in small letters.
 */
export function toShown(stored: string): string {
  const shown = outsideQuotes(stored.replace(/^=/, ""), (code) =>
    code
      .replace(/_xldudf_FOOTING_(\w+)/gi, (_, name: string) => shownAddIn + name.toUpperCase())
      .replace(/_xlfn\.(?:_xlws\.)?([\w.]+)/gi, (_, name: string) => name.toUpperCase())
      .replaceAll("_xlpm.", ""),
  );
  return `=${withoutAnchors(shown)}`;
}

const quotedOrBracketed = new RegExp(String.raw`("(?:[^"]|"")*"|'(?:[^']|'')*'|${bracketed})`, "u");

/** The functions that a formula calls, in capitals and without prefixes; ANCHORARRAY for a spilled range A1#. */
export function functionsIn(formula: string): readonly string[] {
  const called: string[] = [];
  outsideQuotes(toStored(formula), (code) => {
    for (const [, name = ""] of code.matchAll(/([A-Z_][\w.]*)(?=\()/gi)) called.push(name.toUpperCase());
    return code;
  });
  return called.map((name) => name.replace(/^_XLFN\.(?:_XLWS\.)?/, ""));
}

/** The formula with its truth values as most people write them: TRUE, not TRUE(). */
export const withPlainTruths = (formula: string): string =>
  outsideQuotes(formula, (code) => code.replace(/(?<![\w.])(TRUE|FALSE)\(\)/g, "$1"));

/** Whether a formula gives the same in every cell: it asks neither for its own place nor for what stands beside it. */
export function isPlaceless(formula: string): boolean {
  let found = /\[@|\[#This Row\]/i.test(formula);
  outsideQuotes(formula, (code) => {
    found ||= /@|\b(?:ROW|COLUMN)\(\s*\)/i.test(code);
    return code;
  });
  return !found;
}

/** Text in double quotes, sheet names in single ones and columns of tables in brackets stay as they are. */
function outsideQuotes(formula: string, change: (code: string) => string): string {
  const parts = formula.split(quotedOrBracketed);
  return parts.map((part, index) => (index % 2 === 0 ? change(part) : part)).join("");
}
