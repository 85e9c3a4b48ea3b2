import type { BookData, SheetData } from "../book/bookData.ts";
import { functionsSheet } from "./functionsSheet.ts";
import { handover } from "./handover.ts";
import { columnSheet } from "./looks.ts";
import { monthlyRepairs, type Month } from "../../sheet/sample/months.ts";
import { purchaseLots } from "./parts.ts";
import { shops } from "./shops.ts";
import { courierWeeks } from "./weeks.ts";

/**
 * The workbook of Kestrel & Vane, a chain of bicycle-repair shops that does not exist: every figure is drawn
 * from seeded random numbers. Its sheets lie in the four cases of spread and follow-on; then come a
 * regression to review and the worksheet functions, each once.
 */
export function demoBook(): BookData {
  const months = monthlyRepairs();
  return {
    sheets: [monthsSheet(months), shopsSheet(), partsSheet(), weeksSheet(), handover(months), functionsSheet()],
    names: [{ name: "Purchase_lots", refersTo: "Parts!$A$4:$D$64" }],
    active: 0,
  };
}

const monthsSheet = (months: readonly Month[]): SheetData =>
  columnSheet(
    "Months",
    [
      { heading: "Month", values: months.map(({ month }) => month), numberFormat: "mmm yyyy", width: 14 },
      { heading: "Repairs", values: months.map(({ repairs }) => repairs), numberFormat: "#,##0", width: 13 },
      { heading: "Price index", values: months.map(({ priceIndex }) => priceIndex), numberFormat: "0.0", width: 15 },
      { heading: "Advertising", values: months.map(({ advertising }) => advertising), numberFormat: "0.0", width: 15 },
      { heading: "Rainy days", values: months.map(({ rainyDays }) => rainyDays), numberFormat: "0", width: 14 },
    ],
    ["Kestrel & Vane: repairs by month", "All shops. Price index: 2014 = 100. Advertising in thousands."],
  );

function shopsSheet(): SheetData {
  const all = shops();
  const sheet = columnSheet("Shops", [
    { heading: "Shop", values: all.map(({ shop }) => shop), width: 12 },
    { heading: "Takings", values: all.map(({ takings }) => takings), numberFormat: "#,##0", width: 13 },
    { heading: "Staff hours", values: all.map(({ staffHours }) => staffHours), numberFormat: "0", width: 15 },
    { heading: "Floor area", values: all.map(({ floorArea }) => floorArea), numberFormat: "0", width: 14 },
    { heading: "Footfall", values: all.map(({ footfall }) => footfall), numberFormat: "#,##0", width: 13 },
  ]);
  return { ...sheet, tables: [{ name: "Shop_figures", address: `A1:E${all.length + 1}` }] };
}

function partsSheet(): SheetData {
  const lots = purchaseLots();
  return columnSheet(
    "Parts",
    [
      { heading: "Lot", values: lots.map(({ lot }) => lot), width: 12 },
      { heading: "Unit cost", values: lots.map(({ unitCost }) => unitCost), numberFormat: "0.00", width: 14 },
      { heading: "Lot size", values: lots.map(({ lotSize }) => lotSize), numberFormat: "0", width: 13 },
      { heading: "Lead time", values: lots.map(({ leadTime }) => leadTime), numberFormat: "0", width: 14 },
    ],
    ["Purchase lots of brake sets", "Lead time in days."],
  );
}

function weeksSheet(): SheetData {
  const weeks = courierWeeks();
  return columnSheet("Weeks", [
    { heading: "Week from", values: weeks.map(({ week }) => week), numberFormat: "dd/mm/yyyy", width: 15 },
    {
      heading: "Courier cost",
      values: weeks.map(({ courierCost }) => courierCost),
      numberFormat: "#,##0.00",
      width: 16,
    },
    { heading: "Parcels", values: weeks.map(({ parcels }) => parcels), numberFormat: "0", width: 13 },
    { heading: "Fuel", values: weeks.map(({ fuel }) => fuel), numberFormat: "0.000", width: 12 },
  ]);
}
