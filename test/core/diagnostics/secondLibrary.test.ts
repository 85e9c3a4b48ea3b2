import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { arch } from "../../../src/core/diagnostics/arch.ts";
import { breuschGodfrey } from "../../../src/core/diagnostics/breuschGodfrey.ts";
import { breuschPagan } from "../../../src/core/diagnostics/breuschPagan.ts";
import { cusum } from "../../../src/core/diagnostics/cusum.ts";
import { durbinWatson } from "../../../src/core/diagnostics/durbinWatson.ts";
import { jarqueBera } from "../../../src/core/diagnostics/jarqueBera.ts";
import { koenker } from "../../../src/core/diagnostics/koenker.ts";
import { ljungBox } from "../../../src/core/diagnostics/ljungBox.ts";
import type { TestOutcome } from "../../../src/core/diagnostics/outcome.ts";
import { reset } from "../../../src/core/diagnostics/reset.ts";
import { resetRobust } from "../../../src/core/diagnostics/resetRobust.ts";
import { whiteFitted, whiteTest } from "../../../src/core/diagnostics/white.ts";
import { recursiveResiduals } from "../../../src/core/numeric/recursiveResiduals.ts";
import { expectDigits } from "../../support/digits.ts";
import { referenceFit } from "../../support/referenceFit.ts";

interface Found {
  readonly statistic: number;
  readonly p: number;
  readonly f?: number;
  readonly pF?: number;
}

interface Figures {
  readonly spread: Readonly<Record<string, Found>>;
  readonly followOn?: {
    readonly "breusch-godfrey": readonly Found[];
    readonly "ljung-box": readonly Found[];
    readonly arch: readonly Found[];
    readonly "durbin-watson": number;
    readonly cusum: Found;
    readonly recursive: readonly number[];
  };
}

const { figures } = JSON.parse(
  readFileSync(new URL("../../reference/diagnostics/secondLibrary.json", import.meta.url), "utf8"),
) as { readonly figures: Readonly<Record<string, Figures>> };

function expectFound(outcome: TestOutcome, { statistic, p, f, pF }: Found, digits = 10): void {
  if (outcome.kind !== "computed") throw new Error(outcome.because);
  expectDigits(outcome.figure.statistic, statistic, digits);
  expectDigits(outcome.figure.pValue, p, digits);
  if (f === undefined || pF === undefined) return;
  expectDigits(outcome.fForm!.statistic, f, digits);
  expectDigits(outcome.fForm!.pValue, pF, digits);
}

describe.each(Object.keys(figures))("%s", (id) => {
  const fit = referenceFit(id);
  const { spread, followOn } = figures[id]!;

  it("agrees on the spread, the shape and the curve", () => {
    expectFound(koenker(fit), spread["koenker"]!);
    expectFound(breuschPagan(fit), spread["breusch-pagan"]!);
    // The second library squares the raw columns and solves by pseudo-inverse, which costs it digits.
    expectFound(whiteTest(fit, "squares and cross-products"), spread["white"]!, 6);
    expectFound(whiteFitted(fit), spread["white-fitted"]!, 6);
    expectFound(jarqueBera(fit), spread["jarque-bera"]!);
    expectFound(reset(fit), spread["reset"]!, 9);
    expectFound(resetRobust(fit, { kind: "white", version: "HC3" }), spread["resetHC3"]!, 9);
  });

  if (followOn === undefined) return;

  it("agrees on what follows on", () => {
    const orders = [1, 2, 3];
    // Nine digits where the second library takes R^2 as one minus a share of 1e-5 of the total.
    orders.forEach((order, i) => expectFound(breuschGodfrey(fit, order), followOn["breusch-godfrey"][i]!, 9));
    orders.forEach((_, i) => expectFound(ljungBox(fit, orders)[i]!, followOn["ljung-box"][i]!));
    [1, 2].forEach((order, i) => expectFound(arch(fit, order), followOn.arch[i]!, 9));
    const watson = durbinWatson(fit);
    expectDigits(watson.kind === "computed" ? watson.figure.statistic : 0, followOn["durbin-watson"], 11);
    expectFound(cusum(fit), followOn.cusum);
  });

  it("agrees on the recursive residuals", () => {
    const columns = fit.design.terms.map(({ values }) => values);
    const { residuals } = recursiveResiduals({ columns, outcome: fit.design.outcome.values }, "forwards");
    const scale = fit.sigma;
    followOn.recursive.forEach((w, i) => {
      expect(Math.abs(residuals[fit.columnCount + i]! - w) / scale).toBeLessThan(1e-7);
    });
  });
});
