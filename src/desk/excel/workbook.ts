import { parseArea } from "../workbook/areas.ts";
import { activeSheet, hasSheet, recordOf } from "../workbook/book.ts";
import { selectedAreas } from "../workbook/selection.ts";
import { recalculate, recalculateAll } from "../workbook/calculation.ts";
import { asFlag, oneOf, optionalText } from "./arguments.ts";
import { fault } from "./fault.ts";
import { ensureSelection } from "./guards.ts";
import type { Host } from "./host.ts";
import { hold, type Held } from "./held.ts";
import type { Family } from "./model.ts";

export const workbook: Family<null> = {
  read: {
    Name: () => "Book.xlsx",
    ReadOnly: () => false,
    IsDirty: () => true,
  },
  part: {
    Worksheets: () => hold("WorksheetCollection", null),
    Tables: () => hold("TableCollection", { sheet: null }),
    Names: () => hold("NamedItemCollection", { sheet: null }),
    Application: () => hold("Application", null),
    Settings: () => hold("SettingCollection", null),
    CustomXmlParts: () => hold("CustomXmlPartCollection", null),
    Protection: () => hold("WorkbookProtection", null),
    _Runtime: () => hold("Runtime", null),
    GetSelectedRange: (_state, host) => selectedRange(host),
    GetSelectedRanges: (_state, host) => {
      ensureSelection(host);
      return hold("RangeAreas", selectedAreas(host.book));
    },
    GetActiveChartOrNullObject: (_state, host) => activeChart(host),
    GetActiveCell: (_state, host) => activeCell(host),
    _GetRangeForEventByReferenceId: (_state, host, args) => eventRange(host, args[0]) ?? missing(),
    _GetRangeOrNullObjectForEventByReferenceId: (_state, host, args) => eventRange(host, args[0]),
  },
  call: {
    _RemoveReference: (_state, { references }, args) => {
      references.kept.delete(String(args[0]));
    },
    _RemoveAllReferences: (_state, { references }) => references.kept.clear(),
    _GetReferenceCount: (_state, { references }) => references.kept.size,
  },
  lacks: ["ChartDataPointTrack", "UsePrecisionAsDisplayed", "CalculationEngineVersion", "AutoSave", "PreviouslySaved"],
};

/** One area, or none: a selection of several is no range. */
function selectedRange(host: Host): Held {
  ensureSelection(host);
  const areas = selectedAreas(host.book);
  const [area] = areas;
  if (area === undefined || areas.length > 1) throw fault("InvalidSelection");
  return hold("Range", area);
}

/** The chart that is selected: the first of the sheet in front. */
function activeChart({ book, switches }: Host): Held | null {
  const sheet = activeSheet(book);
  const [chart] = recordOf(book, sheet).charts;
  return switches.chartSelected && chart !== undefined ? hold("Chart", { sheet, chart }) : null;
}

function activeCell(host: Host): Held {
  ensureSelection(host);
  const area = selectedAreas(host.book).at(-1);
  if (area === undefined) throw fault("InvalidSelection");
  return hold("Range", { ...area, rows: 1, columns: 1 });
}

/** Events name their range as "sheet-1!A1:B2", the sheet by its id. */
function eventRange({ book }: Host, reference: unknown): Held | null {
  const [sheet = "", address = ""] = String(reference).split("!");
  const area = hasSheet(book, sheet) ? parseArea(book, address, sheet) : null;
  return area === null ? null : hold("Range", area);
}

function missing(): never {
  throw fault("ItemNotFound");
}

const kinds = { Recalculate: false, Full: true, FullRebuild: true } as const;

export const application: Family<null> = {
  read: {
    CalculationMode: (_state, { book }) => (book.manualCalculation ? "Manual" : "Automatic"),
    CalculationState: (_state, host) => (host.isCalculating() ? "Calculating" : "Done"),
    DecimalSeparator: () => ".",
    ThousandsSeparator: () => ",",
    UseSystemSeparators: () => true,
  },
  part: { CultureInfo: () => hold("CultureInfo", null) },
  call: {
    Calculate: (_state, { book }, args) =>
      kinds[oneOf(args[0], kinds)] ? recalculateAll(book) : recalculate(book, []),
    // Nothing is drawn or calculated before a request ends, so both hold by themselves.
    SuspendScreenUpdatingUntilNextSync: () => null,
    SuspendApiCalculationUntilNextSync: () => null,
  },
  lacks: ["CalculationEngineVersion"],
};

export const cultureInfo: Family<null> = {
  read: { Name: () => "en-US" },
  part: { NumberFormat: () => hold("NumberFormatInfo", null) },
};

export const numberFormatInfo: Family<null> = {
  read: { NumberDecimalSeparator: () => ".", NumberGroupSeparator: () => "," },
};

export const runtime: Family<null> = {
  read: { EnableEvents: (_state, { events }) => events.enabled },
  write: {
    EnableEvents: (_state, { events }, value) => {
      events.enabled = asFlag(value);
    },
  },
};

export const workbookProtection: Family<null> = {
  read: { Protected: (_state, { switches }) => switches.structureProtected },
  call: {
    Protect: (_state, { switches }, args) => {
      optionalText(args, 0);
      if (switches.structureProtected) throw fault("AccessDenied");
      switches.structureProtected = true;
    },
    Unprotect: (_state, { switches }) => {
      switches.structureProtected = false;
    },
  },
};
