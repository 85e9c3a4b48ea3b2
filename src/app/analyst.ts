import type { Answer } from "../core/answer/answer.ts";
import type { Finding, Inquiry } from "../core/answer/inquire.ts";
import type { Question } from "../core/answer/question.ts";
import type { Result } from "../core/problem/result.ts";
import type { Errand } from "./host.ts";

/** Who computes: the worker in the pane, the same code in line in Node. Faults of ours reject. */
export interface Analyst {
  readonly analyse: (question: Question, errand: Errand) => Promise<Result<Answer>>;
}

/** Who looks up what goes beyond an answer: figures row by row, covariances, joint tests, predictions. */
export interface Inquirer {
  readonly inquire: (question: Question, inquiry: Inquiry, errand: Errand) => Promise<Result<Finding>>;
}
