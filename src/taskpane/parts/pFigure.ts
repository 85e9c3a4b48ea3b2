import { pValueText } from "../../sheet/tableTexts.ts";

/** A p-value as a table of the pane shows it: "0.034", "< 0.0001", which no line break parts. */
export const pFigure = (pValue: number, level: number): string =>
  pValueText(pValue, level).replace("under ", "<\u00a0");
