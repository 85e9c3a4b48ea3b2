/** Which part of a table a formula speaks of. */
export interface TableReference {
  /** "#headers", "#data" and the like, in small letters. */
  readonly items: readonly string[];
  /** The first and the last column, as their headings are written; none for all of them. */
  readonly columns: readonly string[];
}

/**
 * Reads what stands between the outer brackets behind a table's name.
 * @param inside - "Price", "#Data", "[#Data],[Price]:[Rain]", "@Price", "@[Price]:[Rain]", or "" for all.
 */
export function readTableReference(inside: string): TableReference {
  if (inside.startsWith("@")) return { items: ["#this row"], columns: columnsIn(inside.slice(1).trim()) };
  if (!inside.startsWith("[")) {
    return inside.startsWith("#")
      ? { items: [inside.toLowerCase()], columns: [] }
      : { items: [], columns: columnsIn(inside) };
  }
  const parts = listed(inside);
  return {
    items: parts.filter((part) => part.startsWith("#")).map((part) => part.toLowerCase()),
    columns: parts.filter((part) => !part.startsWith("#")).map(headingIn),
  };
}

const columnsIn = (text: string): string[] =>
  text === "" ? [] : (text.startsWith("[") ? listed(text) : [text]).map(headingIn);

/** The parts that stand in brackets of their own. */
const listed = (text: string): string[] =>
  [...text.matchAll(/\[((?:'[^]|[^[\]'])*)\]/g)].map(([, part = ""]) => part.trim());

/** The heading that brackets hold: an apostrophe makes a letter of the sign behind it. */
export const headingIn = (text: string): string => text.replaceAll(/'([^])/g, "$1");
