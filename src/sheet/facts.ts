/** What the sheet must say that the answer does not know: places, date, version, fingerprint, settings. */
export interface SheetFacts {
  /** "1 December 2026" */
  readonly date: string;
  readonly version: string;
  /** SHA-256 of the data used, in hexadecimal. */
  readonly fingerprint: string;
  /** Ranges with their headings, "Months!$B$3:$B$99". */
  readonly ranges: SourceRanges;
  /** The table that the ranges are of, if any, and its columns as formulas speak of them, so that they follow it as it grows. */
  readonly table: { readonly name: string; readonly columns: SourceRanges } | null;
  /** Settings by name: those that differ from the defaults, and those the columns call for. */
  readonly settings: readonly (readonly [string, string])[];
}

export interface SourceRanges {
  readonly outcome: string;
  readonly drivers: string;
  readonly key: string | null;
}
