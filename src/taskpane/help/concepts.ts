import { firm, leftOutRows, liveAndKept, testsMiss } from "./aboutAnswers.ts";
import { fourCases, groups, referenceDistribution, threeKinds } from "./aboutErrors.ts";
import { reviews } from "./aboutReview.ts";
import type { HelpPage } from "./helpPage.ts";

/** Every page of help by its concept, in the order in which the questions arise. */
export const helpPages = {
  "left-out rows": leftOutRows,
  groups,
  "four cases": fourCases,
  "three kinds": threeKinds,
  "reference distribution": referenceDistribution,
  firm,
  "what tests miss": testsMiss,
  "live and kept": liveAndKept,
  reviews,
} as const satisfies Record<string, HelpPage>;

export type Concept = keyof typeof helpPages;

export const concepts = Object.keys(helpPages) as readonly Concept[];
