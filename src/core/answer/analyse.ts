import type { Result } from "../problem/result.ts";
import type { Answer } from "./answer.ts";
import type { Question, Report } from "./question.ts";

export function analyse(question: Question, report: Report): Result<Answer> {
  report("", 0);
  throw new Error(`not yet: ${question.model.outcome.column}`);
}
