import type { Answer } from "../../answer/answer.ts";
import { listInWords } from "../../answer/wording.ts";
import { sense } from "../../table/senses.ts";
import { cellOf } from "../../table/place.ts";
import type { Comparison, Consequence, ErrorsFound, Explanation } from "../claimReview.ts";
import type { Finding, Rank } from "../finding.ts";
import { quantityInWords } from "../quantityWords.ts";
import { gravestFirst } from "../reviewWords.ts";
import { agrees } from "./agreement.ts";
import { cellsOfRun } from "./changeWords.ts";
import { type ConstantLeftOut, constantFinding } from "./constantLeftOut.ts";
import type { Intended } from "./intended.ts";
import { farthest, finding, mostCells, rankFor } from "./oneFinding.ts";
import type { Bench } from "./trial.ts";
import {
  boundsOfAnother,
  lawsDiffer,
  notReproduced,
  oneDiffers,
  rowsBeyond,
  slips,
  summaryInside,
  textsLeftOut,
  toDo,
  unknownErrors,
} from "./words.ts";

/** Everything that the findings on a claim are made from. */
export interface Reviewed {
  readonly bench: Bench;
  readonly intended: Intended;
  readonly compared: readonly Comparison[];
  readonly explanation: Explanation | null;
  readonly alternatives: readonly Explanation[];
  readonly errors: ErrorsFound | null;
  /** How many kinds were tried where figures that rest on standard errors were reported and none gives them. */
  readonly errorsUnknown: number | null;
  /** The level at which the bounds come out where they do not at the one that is said; null elsewhere. */
  readonly boundsAt: number | null;
  readonly answer: Answer | null;
  /** Why there is no answer, as a sentence; null where there is one. */
  readonly noAnswer: string | null;
  readonly consequences: readonly Consequence[];
  readonly blame: Blame;
  /** Null for a regression that has a constant, or whose report says itself that it has none. */
  readonly constant: ConstantLeftOut | null;
}

/** Which part of the work changes the conclusion on which drivers. */
export interface Blame {
  /** The data or the model: under the reported kind of standard errors the conclusion is another one already. */
  readonly data: readonly string[];
  /** The kind of standard errors. */
  readonly errors: readonly string[];
  /** The version, the lags or the law within an allowed kind. */
  readonly version: readonly string[];
}

export function findingsOf(reviewed: Reviewed): readonly Finding[] {
  return gravestFirst([
    ...explanationFindings(reviewed),
    ...mismatchFindings(reviewed),
    ...rowFindings(reviewed),
    ...errorFindings(reviewed),
    ...(reviewed.constant === null ? [] : [constantFinding(reviewed.bench.claim, reviewed.constant)]),
    ...answerFindings(reviewed),
  ]);
}

function explanationFindings({ explanation, alternatives, compared, blame }: Reviewed): Finding[] {
  if (explanation === null) return [];
  const others = alternatives.map(({ sentence }) => `Or: ${sentence}`);
  return [
    finding({
      rank: rankFor(blame.data, "changes a number"),
      code: explanation.hypotheses.join("+"),
      cells: explanation.cells,
      ...farthest(compared),
      what: [explanation.sentence, ...others].join(" "),
      toDo: toDo.redo,
    }),
  ];
}

function mismatchFindings({ bench, compared, explanation, errorsUnknown, boundsAt, blame }: Reviewed): Finding[] {
  const wrong = compared.filter(({ agrees }) => !agrees);
  if (explanation !== null || wrong.length === 0) return [];
  const rank = rankFor(blame.data, "changes a number");
  const cells = wrong.map(({ reported }) => reported.cell);
  if (boundsAt !== null && bench.claim.level !== undefined) {
    const what = boundsOfAnother(boundsAt, bench.claim.level);
    return [
      finding({ rank, code: "bounds-of-another-level", cells, ...farthest(wrong), what, toDo: toDo.boundsLevel }),
    ];
  }
  if (errorsUnknown !== null) {
    const what = unknownErrors(errorsUnknown);
    return [finding({ rank, code: "errors-not-recognised", cells, ...farthest(wrong), what, toDo: toDo.unexplained })];
  }
  if (wrong.length === 1 && compared.length > 2) {
    const name = quantityInWords(
      wrong[0]!.reported.quantity,
      bench.claim.drivers.map((line) => line.name),
    );
    const what = oneDiffers(name, compared.length, slipOf(wrong[0]!));
    return [finding({ rank, code: "one-number-differs", cells, ...farthest(wrong), what, toDo: toDo.oneNumber })];
  }
  const what = notReproduced(wrong.length, compared.length);
  const next = bench.claim.origin.kind === "formula" ? toDo.recalculate : toDo.unexplained;
  return [finding({ rank, code: "not-reproduced", cells, ...farthest(wrong), what, toDo: next })];
}

/** A slip that one number can come from: its sign, or a factor of ten, a hundred or a thousand. */
function slipOf({ reported, recomputed }: Comparison): string | null {
  if (recomputed === null) return null;
  const scaledTo = (factor: number): boolean =>
    agrees({ value: factor * reported.value, halfUnit: Math.abs(factor) * reported.halfUnit }, recomputed);
  if (scaledTo(-1)) return slips.sign;
  const power = [0.001, 0.01, 0.1, 10, 100, 1000].find(scaledTo);
  return power === undefined ? null : slips.power(power);
}

/** What the claimed range leaves off or takes in, whether or not the report used it so. */
function rowFindings({ bench, intended, explanation, blame }: Reviewed): Finding[] {
  const { frame } = bench;
  const rank = rankFor(explanation === null ? blame.data : [], "changes a number");
  const beyond = intended.beyond.map((run) => {
    const cells = cellsOfRun(frame, run);
    const what = rowsBeyond(listInWords(cells), run.to - run.from);
    return finding({ rank, code: "range-stops-early", cells, what, toDo: toDo.beyond });
  });
  const summaries = intended.summaries.map((row) => {
    const cells = cellsOfRun(frame, { from: row, to: row + 1 });
    return finding({
      rank,
      code: "total-row-in-range",
      cells,
      what: summaryInside(listInWords(cells)),
      toDo: toDo.summary,
    });
  });
  return [...beyond, ...summaries, ...textFindings(bench, rank)];
}

function textFindings({ frame }: Bench, rank: Rank): Finding[] {
  const { lines, driverCount, first, count } = frame;
  const cells = lines.slice(0, driverCount + 1).flatMap(({ line, senses }) => {
    const rows: number[] = [];
    for (let row = first; row < first + count; row++) if (senses[row] === sense.textNumber) rows.push(row);
    const place = { kind: "sheet", sheet: line.sheet, column: line.track, firstRow: line.from - first } as const;
    return rows.map((row) => (line.runs === "down" ? cellOf(place, row) : line.name));
  });
  if (cells.length === 0) return [];
  const what = textsLeftOut(cells.slice(0, mostCells), cells.length);
  return [finding({ rank, code: "text-numbers-left-out", cells, what, toDo: toDo.textNumbers })];
}

function errorFindings({ bench, errors, blame }: Reviewed): Finding[] {
  if (errors === null) return [];
  const cells = bench.claim.reported
    .filter(({ quantity }) => "term" in quantity && quantity.kind !== "coefficient")
    .map(({ cell }) => cell);
  if (!errors.allowed) {
    const rank = rankFor(blame.errors, "changes a number");
    return [finding({ rank, code: "errors-not-allowed", cells, what: errors.sentence, toDo: toDo.errors })];
  }
  if (blame.version.length === 0) return [];
  const what = lawsDiffer(blame.version);
  return [finding({ rank: "worth knowing", code: "errors-version", cells, what, toDo: toDo.version })];
}

const answerFindings = ({ noAnswer, bench }: Reviewed): Finding[] =>
  noAnswer === null
    ? []
    : [
        finding({
          rank: "worth knowing",
          code: "no-answer",
          cells: cellsOfRun(bench.frame, { from: bench.frame.first, to: bench.frame.first + bench.frame.count }),
          what: noAnswer,
          toDo: toDo.noAnswer,
        }),
      ];
