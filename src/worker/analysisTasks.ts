import { analyse } from "../core/answer/analyse.ts";
import type { Answer } from "../core/answer/answer.ts";
import { type Finding, type Inquiry, inquire } from "../core/answer/inquire.ts";
import type { Question, Report } from "../core/answer/question.ts";
import type { Result } from "../core/problem/result.ts";

export interface AnalysisTasks {
  readonly analyse: (asked: Question, report: Report) => Result<Answer>;
  readonly inquire: (asked: Question & { readonly inquiry: Inquiry }, report: Report) => Result<Finding>;
}

export const analysisTasks: AnalysisTasks = {
  analyse,
  inquire: ({ inquiry, ...question }, report) => {
    report("Fitting", 0);
    return inquire(question, inquiry);
  },
};
