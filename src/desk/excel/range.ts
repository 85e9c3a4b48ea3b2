import { fullAddress, isEntireColumn, isEntireRow, type Area } from "../workbook/areas.ts";
import { recalculate } from "../workbook/calculation.ts";
import { selectAreas } from "../workbook/selection.ts";
import { asFlag, flagAt } from "./arguments.ts";
import { clearRange } from "./rangeClear.ts";
import { hyperlinkOf, setHyperlink } from "./rangeLinks.ts";
import { rangeParts } from "./rangeParts.ts";
import {
  columnsHidden,
  countOf,
  ensureSize,
  hasSpill,
  hideColumns,
  hideRows,
  mergeRange,
  placeOf,
  rowsHidden,
  unmergeRange,
} from "./rangeShape.ts";
import {
  categoriesOf,
  formatsOf,
  formulasOf,
  kindsOf,
  setFormats,
  setValues,
  textsOf,
  valuesOf,
} from "./rangeValues.ts";
import { ensureInFront } from "./guards.ts";
import type { Family } from "./model.ts";

export const range: Family<Area> = {
  read: {
    Address: (area, host) => fullAddress(host.book, area),
    AddressLocal: (area, host) => fullAddress(host.book, area),
    RowIndex: ({ row }) => row,
    ColumnIndex: ({ column }) => column,
    RowCount: ({ rows }) => rows,
    ColumnCount: ({ columns }) => columns,
    CellCount: ({ rows, columns }) => countOf(rows * columns),
    IsEntireColumn: isEntireColumn,
    IsEntireRow: isEntireRow,
    Values: (area, host) => valuesOf(host, area),
    ValueTypes: (area, host) => kindsOf(host, area),
    Formulas: (area, host) => formulasOf(host, area),
    FormulasLocal: (area, host) => formulasOf(host, area),
    Text: (area, host) => textsOf(host, area),
    NumberFormat: (area, host) => formatsOf(host, area),
    NumberFormatLocal: (area, host) => formatsOf(host, area),
    NumberFormatCategories: (area, host) => categoriesOf(host, area),
    HasSpill: (area, host) => hasSpill(host, area),
    RowHidden: (area, host) => rowsHidden(host, area),
    ColumnHidden: (area, host) => columnsHidden(host, area),
    Hyperlink: (area, host) => hyperlinkOf(host, area),
    Left: (area, host) => placeOf(host, area).left,
    Top: (area, host) => placeOf(host, area).top,
    Width: (area, host) => placeOf(host, area).width,
    Height: (area, host) => placeOf(host, area).height,
  },
  unasked: ["NumberFormatCategories"],
  write: {
    Values: (area, host, value) => setValues(host, area, value),
    Formulas: (area, host, value) => setValues(host, area, value),
    FormulasLocal: (area, host, value) => setValues(host, area, value),
    NumberFormat: (area, host, value) => setFormats(host, area, value),
    NumberFormatLocal: (area, host, value) => setFormats(host, area, value),
    Hyperlink: (area, host, value) => setHyperlink(host, area, value),
    RowHidden: (area, host, value) => hideRows(host, area, asFlag(value)),
    ColumnHidden: (area, host, value) => hideColumns(host, area, asFlag(value)),
  },
  part: rangeParts,
  call: {
    Select: (area, host) => {
      ensureInFront(host);
      selectAreas(host.book, [area]);
    },
    Clear: (area, host, args) => clearRange(host, area, args[0]),
    Merge: (area, host, args) => mergeRange(host, area, flagAt(args, 0)),
    Unmerge: (area, host) => unmergeRange(host, area),
    Calculate: (area, host) => recalculate(host.book, [area]),
    // The client asks before it writes a large block in pieces: the whole must fit first.
    _ValidateArraySize: (area, host, args) => ensureSize(host, area, args),
  },
  lacks: ["FormulasR1C1", "Hidden", "Style", "LinkedDataTypeState", "SavedAsArray"],
};
