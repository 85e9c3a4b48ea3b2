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
  return outsideQuotes(withThisRow(formula.replace(/^=/, ""), inTable), (code) =>
    code
      .replace(/((?:\$?[A-Z]{1,3})\$?\d{1,7})#/gi, "ANCHORARRAY($1)")
      .replace(/(?<![\w.])([A-Z][A-Z0-9.]*)(?=\()/gi, storedName),
  );
}

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

/** The same formula as people write it, with its "=". */
export function toShown(stored: string): string {
  const shown = outsideQuotes(stored.replace(/^=/, ""), (code) =>
    code
      .replace(/_xldudf_FOOTING_(\w+)/gi, (_, name: string) => shownAddIn + name)
      .replace(/_xlfn\.(?:_xlws\.)?|_xlpm\./g, "")
      .replace(/ANCHORARRAY\(([^()]*)\)/g, "$1#"),
  );
  return `=${shown}`;
}

const quotedOrBracketed = new RegExp(String.raw`("(?:[^"]|"")*"|'(?:[^']|'')*'|${bracketed})`, "u");

/** Text in double quotes, sheet names in single ones and columns of tables in brackets stay as they are. */
function outsideQuotes(formula: string, change: (code: string) => string): string {
  const parts = formula.split(quotedOrBracketed);
  return parts.map((part, index) => (index % 2 === 0 ? change(part) : part)).join("");
}
