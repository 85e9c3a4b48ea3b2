import { blankSheet } from "../book/blankSheet.ts";
import type { BookCell, SheetData } from "../book/bookData.ts";
import { roundTo } from "../../sheet/sample/draws.ts";
import { heightsUnder, looks, titleRows } from "./looks.ts";
import type { Month } from "../../sheet/sample/months.ts";
import { ordinaryFit } from "./ordinaryFit.ts";

const above = ["What drives our repairs?", "Regression of repairs on price, advertising and rain. Data: sheet Months."];
const drivers = ["Constant", "Price index", "Advertising", "Rainy days"];

/**
 * A regression of the monthly repairs as someone handed it over: typed results, the last month left off,
 * and the standard errors of a spreadsheet's own regression, which these months do not allow.
 */
export function handover(months: readonly Month[]): SheetData {
  const used = months.slice(0, -1);
  const fit = ordinaryFit(
    used.map(({ repairs }) => repairs),
    [
      used.map(({ priceIndex }) => priceIndex),
      used.map(({ advertising }) => advertising),
      used.map(({ rainyDays }) => rainyDays),
    ],
  );
  const results = drivers.map((driver, index): BookCell[] => {
    const coefficient = fit.coefficients[index]!;
    const standardError = fit.standardErrors[index]!;
    return [driver, typed(coefficient, 3), typed(standardError, 3), typed(coefficient / standardError, 2)];
  });
  return {
    ...blankSheet("Handover", [
      ...titleRows(above),
      headings,
      ...results,
      [],
      ["R squared", typed(fit.rSquared, 3)],
      ["Observations", typed(fit.rows, 0)],
      [],
      [{ value: conclusion(fit.coefficients[1]!), style: looks.note }],
    ]),
    columnWidths: [18, 16, 18, 12],
    rowHeights: heightsUnder(above),
    onePageWide: true,
  };
}

const headings: readonly BookCell[] = [
  { value: "Driver", style: looks.firstHeading },
  ...["Coefficient", "Standard error", "t ratio"].map((value) => ({ value, style: looks.heading })),
];

const typed = (value: number, digits: number): BookCell => ({
  value: roundTo(value, digits),
  style: { numberFormat: digits === 0 ? "0" : `0.${"0".repeat(digits)}` },
});

const conclusion = (price: number): string =>
  `All three matter. Every point on the price index costs us ${roundTo(-price, 1)} repairs a month: I would not raise prices.`;
