import type { CalendarDriver, Transform } from "../design/model.ts";
import { type Options, defaultOptions } from "./options.ts";

/** A value that was not understood: what it could have been, for the nearest known one. */
export interface NotUnderstood {
  readonly allowed: readonly string[];
}

/** What settings say, before they meet the columns they are about. */
export interface Settings {
  /** null: to be found from the key. */
  readonly rows: "cases" | "time" | "groups" | null;
  readonly constant: boolean;
  /** Headings or numbers of the driver columns used; empty for all. */
  readonly columns: readonly string[];
  readonly categories: readonly string[];
  readonly dates: readonly string[];
  readonly bases: Readonly<Record<string, string>>;
  readonly transforms: readonly { readonly column: string; readonly transform: Transform }[];
  /** Drivers beside the columns as they stand. */
  readonly added: readonly { readonly column: string; readonly transform: Transform }[];
  readonly calendar: readonly CalendarDriver[];
  /** The decimal mark of text that may be read as numbers; null where it may not. */
  readonly textNumbers: "." | "," | null;
  /** The heading of a column of groups that cross the first; null where there is none. */
  readonly secondGroups: string | null;
  readonly options: Options;
}

export const defaultSettings: Settings = {
  rows: null,
  constant: true,
  columns: [],
  categories: [],
  dates: [],
  bases: {},
  transforms: [],
  added: [],
  calendar: [],
  textNumbers: null,
  secondGroups: null,
  options: defaultOptions,
};
