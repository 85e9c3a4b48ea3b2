import { type AnalysisTasks, analysisTasks } from "./analysisTasks.ts";
import { type ReviewTasks, reviewTasks } from "./reviewTasks.ts";

/** What can be computed off the main thread: each task takes what is asked and says how far it has come. */
export type Tasks = AnalysisTasks & ReviewTasks;

export type TaskName = keyof Tasks;
export type Asked<Name extends TaskName> = Parameters<Tasks[Name]>[0];
export type Computed<Name extends TaskName> = ReturnType<Tasks[Name]>;

export const tasks: Tasks = { ...analysisTasks, ...reviewTasks };
