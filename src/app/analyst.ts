import type { Answer } from "../core/answer/answer.ts";
import type { Options } from "../core/answer/options.ts";
import type { Model } from "../core/design/model.ts";
import type { Result } from "../core/problem/result.ts";
import type { Source } from "../core/table/source.ts";
import type { Errand } from "./host.ts";

export interface Question {
  readonly source: Source;
  readonly model: Model;
  readonly options: Options;
}

/** Who computes: the worker in the pane, the same code in line in Node. */
export interface Analyst {
  readonly analyse: (question: Question, errand: Errand) => Promise<Result<Answer>>;
}
