import type { Claim, Quantity } from "../claim.ts";
import { standsInCells } from "../forms.ts";
import type { Change, Facts } from "./change.ts";
import type { Frame } from "./frame.ts";
import type { ModelRecipe } from "./recipe.ts";

/** The changes of what is regressed on what, and in which units; the cells stay as they are. */
export function modelChanges(frame: Frame, claim: Claim): Change[] {
  const { driverCount, lines } = frame;
  const drivers = Array.from({ length: driverCount }, (_, j) => j + 1);
  const inCells = [0, ...drivers].filter((line) => standsInCells(lines[line]!.line));
  const helpers = Array.from({ length: lines.length - driverCount - 1 }, (_, j) => driverCount + 1 + j);
  return [
    modelChange({ hypothesis: claim.constant ? "no-constant" : "with-constant" }, (model) => ({
      constant: !model.constant,
    })),
    ...orders(drivers),
    ...inCells.flatMap((line) => factors.map((factor) => scaled(line, factor))),
    ...inCells.filter((line) => line > 0).map(swapped),
    ...drivers.filter((_, term) => drivers.length > 1 && !isReported(claim, term)).map(leftOut),
    ...helpers.map((line) =>
      modelChange({ hypothesis: "another-driver", line }, (model) =>
        model.drivers.includes(line) ? null : { drivers: [...model.drivers, line] },
      ),
    ),
    ...helpers.flatMap((other) => inCells.map((line) => replaced(line, other))),
  ];
}

const modelChange = (facts: Facts, change: (model: ModelRecipe) => Partial<ModelRecipe> | null): Change => ({
  facts,
  part: "model",
  inPairs: true,
  apply: (recipe) => {
    const changed = change(recipe.model);
    return changed === null ? null : { ...recipe, model: { ...recipe.model, ...changed } };
  },
});

/** Thousands, hundreds (per cent), tens, and their inverses. */
const factors = [1000, 0.001, 100, 0.01, 10, 0.1] as const;

const scaled = (line: number, factor: number): Change =>
  modelChange({ hypothesis: "factor", line, factor }, (model) =>
    model.factors[line] === undefined && (model.outcome === line || model.drivers.includes(line))
      ? { factors: { ...model.factors, [line]: factor } }
      : null,
  );

/** Whose figures stand beside whose name: all the other way round, or those of two drivers exchanged. */
function orders(drivers: readonly number[]): Change[] {
  if (drivers.length < 2) return [];
  const reverse = modelChange({ hypothesis: "reverse-order" }, ({ reportedAs }) => ({
    reportedAs: reportedAs.toReversed(),
  }));
  const pairs = drivers.flatMap((one) => drivers.filter((other) => other > one).map((other) => [one, other] as const));
  const isReverse = ([one, other]: readonly [number, number]): boolean =>
    drivers.length <= 3 && other - one === drivers.length - 1;
  const exchanged = pairs
    .filter((pair) => !isReverse(pair))
    .map((pair) =>
      modelChange({ hypothesis: "drivers-exchanged", lines: pair }, ({ reportedAs }) => ({
        reportedAs: reportedAs.map((place, term) =>
          term === pair[0] - 1 ? reportedAs[pair[1] - 1]! : term === pair[1] - 1 ? reportedAs[pair[0] - 1]! : place,
        ),
      })),
    );
  return [reverse, ...exchanged];
}

/** The outcome took a driver's part, and the driver the outcome's. */
const swapped = (line: number): Change =>
  modelChange({ hypothesis: "swapped", line }, ({ outcome, drivers }) =>
    outcome === 0 && drivers.includes(line)
      ? { outcome: line, drivers: drivers.map((driver) => (driver === line ? 0 : driver)) }
      : null,
  );

const leftOut = (line: number): Change =>
  modelChange({ hypothesis: "driver-left-out", line }, ({ drivers, reportedAs }) => {
    const place = drivers.indexOf(line);
    if (place < 0 || drivers.length < 2) return null;
    const moved = (one: number | null): number | null =>
      one === null || one === place ? null : one > place ? one - 1 : one;
    return { drivers: drivers.filter((driver) => driver !== line), reportedAs: reportedAs.map(moved) };
  });

const replaced = (line: number, other: number): Change =>
  modelChange({ hypothesis: "another-column", line, other }, ({ outcome, drivers }) => {
    if (drivers.includes(other) || outcome === other) return null;
    if (outcome === line) return { outcome: other };
    return drivers.includes(line) ? { drivers: drivers.map((driver) => (driver === line ? other : driver)) } : null;
  });

/** Whether the report has a number of this driver's own, or a prediction, which needs all of them. */
function isReported({ reported }: Claim, term: number): boolean {
  const speaks = (quantity: Quantity): boolean =>
    quantity.kind === "prediction" || ("term" in quantity && quantity.term === term);
  return reported.some(({ quantity }) => speaks(quantity));
}
