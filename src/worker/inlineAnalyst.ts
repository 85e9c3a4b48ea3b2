import type { Analyst, Inquirer } from "../app/analyst.ts";
import { type AnalysisTasks, analysisTasks } from "./analysisTasks.ts";
import { onThisThread } from "./onThisThread.ts";

/** Computes on the calling thread. */
export const inlineAnalystOf = ({ analyse, inquire }: AnalysisTasks): Analyst & Inquirer => ({
  analyse: (question, errand) => onThisThread(errand, (report) => analyse(question, report)),
  inquire: (question, inquiry, errand) => onThisThread(errand, (report) => inquire({ ...question, inquiry }, report)),
});

/** In Node; browsers where a worker cannot start load it late. */
export const inlineAnalyst = inlineAnalystOf(analysisTasks);
