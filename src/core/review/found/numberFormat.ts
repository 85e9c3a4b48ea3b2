/** What a number format does to the digits of a number. */
export interface NumberFormat {
  readonly decimals: number;
  /** How many per cent signs it has: each shows a hundred times the number. */
  readonly percents: number;
  /** What is shown is this times the number, beside the per cent signs: 0.001 for thousands. */
  readonly scale: number;
  readonly scientific: boolean;
  /** Thousands apart by commas. */
  readonly grouped: boolean;
  /** "%" or " %" as the format has it, "" where it has none. */
  readonly percentSign: string;
}

/**
 * Reads a number format in English letters, as Excel's API gives it.
 * @returns null where it leaves the digits to the number: General, text, dates, fractions.
 */
export function readNumberFormat(format: string, value: number): NumberFormat | null {
  const section = sectionFor(format, value).replaceAll(/"[^"]*"|\\.|[_*].|\[[^\]]*\]/g, "");
  if (!/[0#?]/.test(section) || /General|[@/ydhms]/i.test(section)) return null;
  const [, whole = "", decimals = ""] = /^([^.]*)(?:\.([^E]*))?/i.exec(section) ?? [];
  const thousands = /[0#?](,+)[^0#?,]*$/.exec(whole)?.[1] ?? "";
  return {
    decimals: countDigits(decimals),
    percents: section.split("%").length - 1,
    scale: 1000 ** -(thousands.length || trailingCommas(decimals)),
    scientific: /E[+-]/i.test(section),
    grouped: /[0#?],+[0#?]/.test(whole),
    percentSign: / ?%/.exec(section)?.[0] ?? "",
  };
}

const countDigits = (part: string): number => part.replaceAll(/[^0#?]/g, "").length;

/** Commas behind the decimals, as in "0.0,", scale the number too. */
const trailingCommas = (decimals: string): number => /[0#?](,+)[^0#?,]*$/.exec(decimals)?.[1]?.length ?? 0;

/**
 * Whether a format sets a number in round brackets, and whether a minus is shown with it: "0.00;(0.00)" puts brackets in
 * place of the minus, "(0.00)" puts them beside it.
 * @returns null where the number stands without brackets.
 */
export function bracketsIn(format: string, value: number): { readonly minus: boolean } | null {
  const section = sectionFor(format, value).replaceAll(/[_*]./g, "");
  if (!/\([^)]*[0#?][^)]*\)/.test(section)) return null;
  return { minus: value < 0 && (sectionsOf(format).length === 1 || section.includes("-")) };
}

/** A format may have parts for positive and negative numbers and for zero. */
function sectionFor(format: string, value: number): string {
  const sections = sectionsOf(format);
  const index = value < 0 ? 1 : value === 0 ? 2 : 0;
  return sections[index] ?? sections[0]!;
}

const sectionsOf = (format: string): readonly string[] => format.match(/(?:"[^"]*"|\\.|[^;])+/g) ?? [format];
