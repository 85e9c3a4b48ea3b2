import type { RowsSummary } from "../core/answer/answer.ts";
import { rowsSummary } from "../core/answer/rowsSummary.ts";
import { buildDesign } from "../core/design/buildDesign.ts";
import type { LeftOut } from "../core/design/design.ts";
import { type Result, success } from "../core/problem/result.ts";
import type { Source } from "../core/table/source.ts";
import { questionOf } from "./questionOf.ts";
import type { Setup } from "./setup.ts";

/** What a set-up makes of the rows, before any answer: how many it can use, in which order, and what is left out. */
export interface Preview {
  readonly used: number;
  readonly rows: RowsSummary;
  readonly leftOut: readonly LeftOut[];
  readonly leftOutCount: number;
  readonly notes: readonly string[];
}

/** More rows than these would hold up the pane; what is left out is then told with the answer. */
const mostRows = 20_000;

/**
 * Tries a set-up on its data.
 * @returns null where there are too many rows to do so at each change; else the fault that would stop the answer, or
 *   what the answer would rest on.
 */
export function previewOf(source: Source, setup: Setup): Result<Preview> | null {
  if (source.rowCount > mostRows) return null;
  const question = questionOf(source, setup);
  if (!question.ok) return question;
  const design = buildDesign(question.value.source, question.value.model);
  if (!design.ok) return design;
  const { rowCount, leftOut, leftOutCount, notes } = design.value;
  return success({ used: rowCount, rows: rowsSummary(design.value), leftOut, leftOutCount, notes });
}
