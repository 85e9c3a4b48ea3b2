import { analyse } from "../core/answer/analyse.ts";
import type { Answer } from "../core/answer/answer.ts";
import type { Question, Report } from "../core/answer/question.ts";
import type { Result } from "../core/problem/result.ts";

/** What can be computed off the main thread: each task takes a question and says how far it has come. */
export interface Tasks {
  readonly analyse: (question: Question, report: Report) => Result<Answer>;
}

export type TaskName = keyof Tasks;

export const tasks: Tasks = { analyse };
