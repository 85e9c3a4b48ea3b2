import { fewestGroups } from "../design/groupings.ts";
import type { Decision } from "./decision.ts";
import type { Evidence } from "./evidence.ts";

type Settled = Pick<Decision, "policy" | "fourCase" | "called" | "inForce" | "restsOn">;

interface Caution {
  readonly applies: (settled: Settled, evidence: Evidence) => boolean;
  readonly sentence: (evidence: Evidence, settled: Settled) => string;
}

/** Below this many degrees of freedom the tests often miss what is there (the Monte Carlo behind the careful policy). */
const fewDegreesOfFreedom = 100;

/** With fewer groups than this, t with G - 1 degrees of freedom is too optimistic (common practice: 40 to 50). */
const fewGroups = 42;

const degreesOfFreedom = ({ sizes }: Evidence): number => sizes.rows - sizes.columns;

/** With so few rows to spare neither the tests nor the standard errors have anything to go by. */
const hardlyAny = 10;

/** Bell and McCaffrey (2002), Survey Methodology 28, 169-181: made for few groups. */
const remedyFor = ({ errors }: Settled["inForce"]): string =>
  errors.kind === "grouped" && errors.version !== "CR2" ? " The version CR2 corrects for part of it." : "";

const cautions: readonly Caution[] = [
  {
    applies: (_, evidence) => degreesOfFreedom(evidence) < hardlyAny,
    sentence: (evidence) => {
      const spare = degreesOfFreedom(evidence);
      return `There ${spare === 1 ? "is only 1 row" : `are only ${spare} rows`} more than coefficients: the tests can find next to nothing and the standard errors are themselves a guess.`;
    },
  },
  {
    applies: ({ fourCase, called }, evidence) =>
      fourCase.spread === "even" &&
      called.errors.kind === "classical" &&
      degreesOfFreedom(evidence) < fewDegreesOfFreedom,
    sentence: ({ sizes, order }) =>
      `With ${sizes.rows} rows the tests can miss a problem; treat "even spread"${
        order.kind === "time" ? ' and "no follow-on"' : ""
      } as not contradicted rather than shown. Where the robust figures tell a different story, trust them.`,
  },
  {
    applies: ({ inForce }, evidence) =>
      inForce.errors.kind === "newey-west" && degreesOfFreedom(evidence) < fewDegreesOfFreedom,
    sentence: () =>
      "With this few rows even the robust p-value is too optimistic: a stated 5 % can really be 10 to 20 %, more with a trend. Treat p between 0.01 and 0.05 as undecided.",
  },
  {
    applies: (_, { order }) => order.kind === "cases",
    sentence: () =>
      "Whether errors follow on is not asked: rows are separate cases, so their order in the sheet means nothing. If they run through time, say so and ask again.",
  },
  {
    applies: (_, { order }) => order.kind === "groups" && fewestGroups(order) < fewGroups,
    sentence: ({ order }, { inForce }) =>
      `There are only ${order.kind === "groups" ? fewestGroups(order) : 0} groups: the standard errors by group are then too small more often than not.${remedyFor(inForce)}`,
  },
  {
    applies: ({ called, inForce }) => called.errors.kind !== inForce.errors.kind,
    sentence: () => "The standard errors in force were fixed by hand and are not those the evidence calls for.",
  },
];

/** What the reader must know beside the choice, as sentences, most pressing first. */
export const cautionsOf = (settled: Settled, evidence: Evidence): string[] =>
  cautions.filter(({ applies }) => applies(settled, evidence)).map(({ sentence }) => sentence(evidence, settled));
