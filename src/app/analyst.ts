import type { Answer } from "../core/answer/answer.ts";
import type { Question } from "../core/answer/question.ts";
import type { Result } from "../core/problem/result.ts";
import type { Errand } from "./host.ts";

/** Who computes: the worker in the pane, the same code in line in Node. Faults of ours reject. */
export interface Analyst {
  readonly analyse: (question: Question, errand: Errand) => Promise<Result<Answer>>;
}
