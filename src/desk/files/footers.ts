import type { PageFooter } from "../book/bookData.ts";

/** A footer as files hold it: its left, middle and right part behind &L, &C and &R. */
export const toFileFooter = ({ left, center, right }: PageFooter): string =>
  [part("&L", left), part("&C", center), part("&R", right)].join("");

const part = (sign: string, text: string): string => (text === "" ? "" : sign + text);

/** @returns null for a footer that says nothing. Text before the first sign stands in the middle. */
export function toBookFooter(text: string): PageFooter | null {
  const parts: Record<string, string> = {};
  for (const [, sign = "C", words = ""] of text.matchAll(/(?:&([LCR])|^)((?:(?!&[LCR])[^])*)/g)) {
    parts[sign] = (parts[sign] ?? "") + words;
  }
  const { L: left = "", C: center = "", R: right = "" } = parts;
  return left + center + right === "" ? null : { left, center, right };
}
