import { type Result, failure, success } from "../core/problem/result.ts";
import { bookOption } from "./arguments.ts";
import { type FlagTable, readFlags } from "./flags.ts";

/** What `footing review` was asked. */
export interface ReviewCommand {
  readonly book: string;
  readonly sheet: string | null;
  /** The cells that report the regression, as typed; null where every regression of the book is meant. */
  readonly reported: string | null;
  readonly outcome: string | null;
  readonly drivers: readonly string[];
  readonly save: string | null;
  readonly json: boolean;
}

const flagTable: FlagTable = {
  sheet: { type: "string" },
  reported: { type: "string" },
  outcome: { type: "string" },
  drivers: { type: "string", multiple: true },
  save: { type: "string" },
  json: { type: "boolean" },
  help: { type: "boolean" },
};

/**
 * Reads the words after `footing review`.
 * @returns Problem "unknown-setting" for a flag that does not exist, "missing-option" where one must be given.
 */
export function readReviewCommand(words: readonly string[]): Result<ReviewCommand> {
  const read = readFlags(words, flagTable);
  if (!read.ok) return read;
  const { text, texts, has, positionals } = read.value;
  const [book] = positionals;
  const [reported, outcome, drivers] = [text("reported"), text("outcome"), texts("drivers")];
  if (book === undefined) return failure({ code: "missing-option", option: bookOption });
  if (reported === null && (outcome !== null || drivers.length > 0)) {
    return failure({ code: "missing-option", option: "--reported, the cells that report the regression" });
  }
  return success({ book, sheet: text("sheet"), reported, outcome, drivers, save: text("save"), json: has("json") });
}
