import type { Errand } from "../app/errand.ts";
import type { Host } from "../app/host.ts";
import type { FoundData } from "../app/tableInHand.ts";
import { modelOf } from "../core/answer/modelOf.ts";
import type { Question } from "../core/answer/question.ts";
import { readSettings } from "../core/answer/settings.ts";
import { type Result, success } from "../core/problem/result.ts";
import type { AnswerCommand } from "./arguments.ts";
import { columnsAsked } from "./columnsAsked.ts";

/** A question and the table that it was found in. */
export interface Asked {
  readonly question: Question;
  readonly table: FoundData;
}

/** Reads the table that a command speaks of, and turns its words into a question. */
export async function questionOf(host: Host, command: AnswerCommand, errand: Errand): Promise<Result<Asked>> {
  const settings = readSettings(withRows(command));
  if (!settings.ok) return settings;
  const columns = await columnsAsked(host, command, errand);
  if (!columns.ok) return columns;
  const { table, outcome, drivers, order, groups } = columns.value;
  const parts = {
    outcome,
    drivers,
    key: groups ?? order,
    keyIs: groups === null ? ("time" as const) : ("groups" as const),
    order: groups === null ? null : order,
  };
  const model = modelOf(settings.value, parts);
  if (!model.ok) return model;
  return success({ question: { source: table.source, model: model.value, options: settings.value.options }, table });
}

/** --groups and --order say what rows are where --rows does not. */
function withRows({ settings, groups, order }: AnswerCommand): AnswerCommand["settings"] {
  if (settings.some(([name]) => name === "rows")) return settings;
  const rows = groups !== null ? "groups" : order !== null ? "time" : null;
  return rows === null ? settings : [["rows", rows], ...settings];
}
