import type { Guard, GuardName } from "../../core/diagnostics/guards/guard.ts";

/** What each guard watches, as a heading. */
export const guardNames: Readonly<Record<GuardName, string>> = {
  collinearity: "Drivers that move together",
  influence: "Single rows",
  trending: "Series that wander",
  breaks: "Breaks",
  time: "Time",
  groups: "Groups",
};

/** The names of the guards that came to a finding, as they stand in a sentence. */
export const guardsWith = (found: readonly Guard[], wanted: Guard["finding"]): readonly string[] =>
  found.flatMap(({ guard, finding }) => (finding === wanted ? [guardNames[guard].toLowerCase()] : []));
