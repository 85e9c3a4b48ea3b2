import { messageOf } from "../core/problem/messages.ts";
import type { Problem } from "../core/problem/problem.ts";

/** The part of Excel's custom functions runtime that is used. */
export type FunctionsRuntime = Pick<typeof CustomFunctions, "associate" | "Error" | "ErrorCode">;

/** Excel shows the sentence of an error for these two alone. */
type Sign = "invalidValue" | "notAvailable";

/** #VALUE!: the cells or the settings are to be mended. #N/A: there is no answer to give, or not now. */
const signs = {
  "no-data": "invalidValue",
  "no-headings": "invalidValue",
  "empty-column": "invalidValue",
  "no-numbers": "invalidValue",
  "text-in-number-column": "invalidValue",
  "text-numbers": "invalidValue",
  "dates-as-text": "invalidValue",
  "dates-in-number-column": "invalidValue",
  "error-cells": "invalidValue",
  "unreadable-time": "invalidValue",
  "missing-time": "invalidValue",
  "repeated-time": "invalidValue",
  "unequal-heights": "invalidValue",
  "too-many-columns": "invalidValue",
  "ranges-apart": "invalidValue",
  "overlapping-ranges": "invalidValue",
  "no-outcome": "invalidValue",
  "no-drivers": "invalidValue",
  "ambiguous-heading": "invalidValue",
  "unknown-heading": "invalidValue",
  "unknown-coefficient": "invalidValue",
  "repeated-heading": "invalidValue",
  "column-used-twice": "invalidValue",
  "no-time-column": "invalidValue",
  "no-group-column": "invalidValue",
  "one-group": "notAvailable",
  "one-category": "notAvailable",
  "unknown-base": "invalidValue",
  "logarithm-of-nonpositive": "invalidValue",
  "growth-from-nonpositive": "invalidValue",
  "too-many-categories": "invalidValue",
  "transform-needs-time": "invalidValue",
  "calendar-needs-dates": "invalidValue",
  "too-few-rows": "notAvailable",
  "constant-column": "notAvailable",
  "constant-outcome": "notAvailable",
  "dependent-columns": "notAvailable",
  "perfect-fit": "notAvailable",
  "numbers-too-large": "invalidValue",
  "zero-standard-error": "notAvailable",
  "errors-need-order": "notAvailable",
  "too-many-lags": "invalidValue",
  "unknown-setting": "invalidValue",
  "unknown-value": "invalidValue",
  "missing-option": "invalidValue",
  "unreadable-file": "notAvailable",
  "unwritable-file": "notAvailable",
  "no-formulas": "notAvailable",
  "no-report": "notAvailable",
  "nothing-to-review": "notAvailable",
  "regression-not-in-columns": "notAvailable",
  "stored-by-newer": "notAvailable",
  "stored-unreadable": "notAvailable",
  "setup-gone": "notAvailable",
  "setup-unnamed": "notAvailable",
  "setup-name-taken": "notAvailable",
  "setup-data-gone": "notAvailable",
  "cells-of-others": "notAvailable",
  "sheet-not-known": "notAvailable",
  "too-few-setups": "notAvailable",
  "cell-being-edited": "notAvailable",
  "several-areas-selected": "notAvailable",
  "chart-selected": "notAvailable",
  "other-workbook": "notAvailable",
  "sheet-protected": "notAvailable",
  "not-a-result-sheet": "notAvailable",
  "values-missing": "notAvailable",
  "workbook-protected": "notAvailable",
  "unknown-place": "notAvailable",
  "bad-address": "notAvailable",
  "too-much-for-excel": "notAvailable",
  "excel-too-old": "notAvailable",
  "read-only": "notAvailable",
  "excel-busy": "notAvailable",
  "excel-refused": "notAvailable",
  "time-limit": "notAvailable",
  cancelled: "notAvailable",
} as const satisfies Record<Problem["code"], Sign>;

/** A problem as the error of a cell, its sentence as the error's message. */
export const cellError = (runtime: FunctionsRuntime, problem: Problem): CustomFunctions.Error =>
  new runtime.Error(runtime.ErrorCode[signs[problem.code]], messageOf(problem));

/** A test that does not apply has no figure to give. */
export const notAvailable = (runtime: FunctionsRuntime, because: string): CustomFunctions.Error =>
  new runtime.Error(runtime.ErrorCode.notAvailable, because);

/** A fault of the add-in's own: said as one, with what is needed to find it. */
export const ownFault = (runtime: FunctionsRuntime, fault: unknown): CustomFunctions.Error => {
  const detail = fault instanceof Error ? fault.message : String(fault);
  return new runtime.Error(runtime.ErrorCode.invalidValue, `Footing has a fault of its own here: ${detail}`);
};
