import { pValueInWords } from "../../core/answer/wording.ts";

/** A p-value as a table shows it: "0.034", "< 0.0001", which no line break parts. */
export const pFigure = (pValue: number, level: number): string =>
  pValueInWords(pValue, level)
    .replace(/^p (= )?/, "")
    .replace("under ", "<\u00a0");
