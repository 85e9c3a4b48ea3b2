import { execFileSync } from "node:child_process";
import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { parseArgs } from "node:util";
import { covarianceOf } from "../../../src/core/covariance/covarianceOf.ts";
import { lagsForRows } from "../../../src/core/covariance/lags.ts";
import { breuschGodfrey } from "../../../src/core/diagnostics/breuschGodfrey.ts";
import { koenker } from "../../../src/core/diagnostics/koenker.ts";
import type { TestOutcome } from "../../../src/core/diagnostics/outcome.ts";
import type { Design } from "../../../src/core/design/design.ts";
import { fitLeastSquares } from "../../../src/core/fit/fitLeastSquares.ts";
import { fitOf } from "../../bench/data.ts";

/**
 * Times the fit, HC3, Newey-West with the thumb rule, Koenker's test and Breusch and Godfrey's of order 2 here and with
 * R's lm, vcovHC, NeweyWest, bptest and bgtest on the same numbers, checks that both agree, and prints the ratio.
 * Run from the project's folder: npx tsx test/reference/scripts/speedAgainstR.ts [--rows 200000] [--drivers 20]
 */
const { values } = parseArgs({
  options: { rows: { type: "string", default: "200000" }, drivers: { type: "string", default: "20" } },
});
const size = { rows: Number(values.rows), drivers: Number(values.drivers) };
const lags = lagsForRows(size.rows, "thumb");
const { design } = fitOf(size);

const [secondsOfR, ...figuresOfR] = withR(design);
estimate(design);
const start = performance.now();
const figures = estimate(design);
const seconds = (performance.now() - start) / 1000;

figures.forEach((figure, index) => {
  if (!(Math.abs(figure / figuresOfR[index]! - 1) < 1e-7)) throw new Error(`${figure} here, ${figuresOfR[index]} in R`);
});
process.stdout.write(
  `${size.rows} rows, ${size.drivers} drivers, ${lags} lags: ${seconds.toFixed(2)} s, R ${secondsOfR!.toFixed(2)} s, ` +
    `ratio ${(secondsOfR! / seconds).toFixed(1)}\n`,
);

function estimate(of: Design): number[] {
  const fitted = fitLeastSquares(of);
  if (!fitted.ok) throw new Error(fitted.problem.code);
  const fit = fitted.value;
  const error = (choice: Parameters<typeof covarianceOf>[1]): number => {
    const covariance = covarianceOf(fit, choice);
    if (!covariance.ok) throw new Error(covariance.problem.code);
    return covariance.value.standardErrors[1]!;
  };
  return [
    fit.coefficients[1]!,
    error({ kind: "white", version: "HC3" }),
    error({ kind: "newey-west", lags: { kind: "given", lags }, adjusted: true }),
    statisticOf(koenker(fit)),
    statisticOf(breuschGodfrey(fit, 2)),
  ];
}

function statisticOf(outcome: TestOutcome): number {
  if (outcome.kind === "not-applicable") throw new Error(outcome.because);
  return outcome.figure.statistic;
}

/** Seconds, then the same figures. */
function withR({ outcome, terms }: Design): number[] {
  const folder = mkdtempSync(join(tmpdir(), "speed-"));
  const file = join(folder, "values.bin");
  const columns = [outcome.values, ...terms.slice(1).map((term) => term.values)];
  writeFileSync(file, Buffer.concat(columns.map((column) => Buffer.from(column.buffer))));
  const script = join(import.meta.dirname, "speed.R");
  const given = [script, file, String(size.rows), String(size.drivers), String(lags)];
  try {
    return execFileSync("Rscript", given, { encoding: "utf8" }).trim().split("\n").map(Number);
  } finally {
    rmSync(folder, { recursive: true });
  }
}
