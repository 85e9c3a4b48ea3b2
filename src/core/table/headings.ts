import { columnLetters } from "./address.ts";
import { plainHeading } from "./headingRow.ts";

/** A column to be named: what stands above it ("" for nothing), and where it is, "column F". */
export interface Unnamed {
  readonly heading: string;
  readonly where: string;
}

/**
 * One name a column, no two the same in letters: a column without a heading goes by its place ("Column C"), a
 * repeated heading has its place beside it ("Price (column F)").
 */
export function distinctNames(columns: readonly Unnamed[]): string[] {
  const taken = new Set<string>();
  return columns.map(({ heading, where }) => {
    const plain = heading === "" ? where.charAt(0).toUpperCase() + where.slice(1) : heading;
    const name = taken.has(plainHeading(plain)) ? `${plain} (${where})` : plain;
    taken.add(plainHeading(name));
    return name;
  });
}

/** "column F" */
export const columnInWords = (column: number): string => `column ${columnLetters(column)}`;
