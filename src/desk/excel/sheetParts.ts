import type { PageMargins } from "../book/bookData.ts";
import { localAddress } from "../workbook/areas.ts";
import { recordOf, worksheetOf } from "../workbook/book.ts";
import { freeze } from "../workbook/sheets.ts";
import { asNumber, asText, integerAt, oneOf, stateAt, textAt } from "./arguments.ts";
import { areaAt } from "./addresses.ts";
import { fault } from "./fault.ts";
import { ensureInFront } from "./guards.ts";
import type { Host } from "./host.ts";
import { hold, type Held, type OnSheet, type States } from "./held.ts";
import type { Arguments, Family } from "./model.ts";
import type { Area } from "../workbook/areas.ts";

export const freezePanes: Family<OnSheet> = {
  part: {
    GetLocation: (state, host) => location(state, host) ?? missing(),
    GetLocationOrNullObject: location,
  },
  call: {
    FreezeRows: (state, host, args) => keep(host, state, { rows: integerAt(args, 0, 0), columns: 0 }),
    FreezeColumns: (state, host, args) => keep(host, state, { rows: 0, columns: integerAt(args, 0, 0) }),
    FreezeAt: (state, host, args) => {
      const area = rangeAt(host, state, args);
      keep(host, state, { rows: area.row + area.rows, columns: area.column + area.columns });
    },
    Unfreeze: (state, host) => keep(host, state, { rows: 0, columns: 0 }),
  },
};

function keep(host: Host, { sheet }: OnSheet, counts: { rows: number; columns: number }): void {
  ensureInFront(host);
  if (counts.rows < 0 || counts.columns < 0) throw fault("InvalidArgument");
  freeze(host.book, sheet, counts);
}

function location({ sheet }: OnSheet, { book }: Host): Held | null {
  const { xSplit, ySplit } = worksheetOf(book, sheet).getFreeze();
  if (xSplit === 0 && ySplit === 0) return null;
  const rows = ySplit === 0 ? 1_048_576 : ySplit;
  return hold("Range", { sheet, row: 0, column: 0, rows, columns: xSplit === 0 ? 16_384 : xSplit });
}

function missing(): never {
  throw fault("ItemNotFound");
}

const rangeAt = (host: Host, { sheet }: OnSheet, args: Arguments): Area =>
  typeof args[0] === "string" ? areaAt(host, args[0], sheet) : stateAt(args, 0, "Range");

/** Of a page that says nothing, in points. */
const usualMargins: PageMargins = { left: 50.4, right: 50.4, top: 54, bottom: 54, footer: 21.6 };

const readMargin =
  (side: keyof PageMargins) =>
  ({ sheet }: OnSheet, { book }: Host): number =>
    (recordOf(book, sheet).margins ?? usualMargins)[side];

const writeMargin =
  (side: keyof PageMargins) =>
  ({ sheet }: OnSheet, { book }: Host, value: unknown): void => {
    const record = recordOf(book, sheet);
    record.margins = { ...(record.margins ?? usualMargins), [side]: asNumber(value) };
  };

const orientations = { Portrait: false, Landscape: true } as const;

export const pageLayout: Family<OnSheet> = {
  read: {
    Orientation: ({ sheet }, { book }) => (recordOf(book, sheet).landscape ? "Landscape" : "Portrait"),
    Zoom: ({ sheet }, { book }) => (recordOf(book, sheet).onePageWide ? { horizontalFitToPages: 1 } : { scale: 100 }),
    LeftMargin: readMargin("left"),
    RightMargin: readMargin("right"),
    TopMargin: readMargin("top"),
    BottomMargin: readMargin("bottom"),
    FooterMargin: readMargin("footer"),
  },
  write: {
    LeftMargin: writeMargin("left"),
    RightMargin: writeMargin("right"),
    TopMargin: writeMargin("top"),
    BottomMargin: writeMargin("bottom"),
    FooterMargin: writeMargin("footer"),
    Orientation: ({ sheet }, { book }, value) => {
      recordOf(book, sheet).landscape = orientations[oneOf(value, orientations)];
    },
    Zoom: ({ sheet }, { book }, value) => {
      const zoom = value as { readonly horizontalFitToPages?: number } | null;
      recordOf(book, sheet).onePageWide = zoom?.horizontalFitToPages === 1;
    },
  },
  part: {
    HeadersFooters: (state) => hold("HeaderFooterGroup", state),
    GetPrintArea: (state, host) => printArea(state, host) ?? missing(),
    GetPrintAreaOrNullObject: printArea,
  },
  call: {
    SetPrintArea: (state, host, args) => {
      recordOf(host.book, state.sheet).printArea = localAddress(rangeAt(host, state, args));
    },
  },
  lacks: [
    "PaperSize",
    "BlackAndWhite",
    "PrintErrors",
    "CenterHorizontally",
    "CenterVertically",
    "PrintHeadings",
    "PrintGridlines",
    "HeaderMargin",
    "PrintComments",
    "DraftMode",
    "FirstPageNumber",
    "PrintOrder",
  ],
};

function printArea({ sheet }: OnSheet, host: Host): Held | null {
  const address = recordOf(host.book, sheet).printArea;
  return address === null ? null : hold("RangeAreas", [areaAt(host, address, sheet)]);
}

export const customProperties: Family<OnSheet> = {
  items: ({ sheet }, { book }) =>
    [...recordOf(book, sheet).customProperties.keys()].map((key) => hold("WorksheetCustomProperty", { sheet, key })),
  part: {
    "": (state, host, args) => property(host, state, args) ?? missing(),
    GetItemOrNullObject: (state, host, args) => property(host, state, args),
    Add: ({ sheet }, { book }, args) => {
      recordOf(book, sheet).customProperties.set(textAt(args, 0), asText(args[1]));
      return hold("WorksheetCustomProperty", { sheet, key: textAt(args, 0) });
    },
  },
  call: { GetCount: ({ sheet }, { book }) => recordOf(book, sheet).customProperties.size },
};

/** Keys are equal without regard to case. */
function property({ book }: Host, { sheet }: OnSheet, args: Arguments): Held | null {
  const wanted = textAt(args, 0).toLowerCase();
  const key = [...recordOf(book, sheet).customProperties.keys()].find((known) => known.toLowerCase() === wanted);
  return key === undefined ? null : hold("WorksheetCustomProperty", { sheet, key });
}

export const customProperty: Family<States["WorksheetCustomProperty"]> = {
  id: ({ key }) => key,
  read: {
    Key: ({ key }) => key,
    Value: ({ sheet, key }, { book }) => recordOf(book, sheet).customProperties.get(key) ?? missing(),
  },
  write: {
    Value: ({ sheet, key }, { book }, value) => {
      recordOf(book, sheet).customProperties.set(key, asText(value));
    },
  },
  call: {
    Delete: ({ sheet, key }, { book }) => {
      recordOf(book, sheet).customProperties.delete(key);
    },
  },
};
