import { futureFunctions, worksheetOnly } from "./futureFunctions.ts";

/** How Excel stores the functions of an add-in whose namespace is FOOTING. */
const storedAddIn = "_xldudf_FOOTING_";
const shownAddIn = "FOOTING.";

/**
 * A formula as a file holds it: without "=", add-in functions as _xldudf_FOOTING_ANSWER(...), younger functions
 * with their prefix, a spilled range A1# as ANCHORARRAY(A1).
 */
export function toStored(formula: string): string {
  return outsideQuotes(formula.replace(/^=/, ""), (code) =>
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

/** Text in double quotes and sheet names in single ones stay as they are. */
function outsideQuotes(formula: string, change: (code: string) => string): string {
  const parts = formula.split(/("(?:[^"]|"")*"|'(?:[^']|'')*')/);
  return parts.map((part, index) => (index % 2 === 0 ? change(part) : part)).join("");
}
