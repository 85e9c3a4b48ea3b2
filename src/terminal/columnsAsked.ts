import type { Errand } from "../app/errand.ts";
import type { Host } from "../app/host.ts";
import { type FoundData, readPlaced } from "../app/tableInHand.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { type SheetArea, addressOf, localAddressOf, parseAddress } from "../core/table/address.ts";
import { rangesFault } from "../core/table/ranges.ts";
import type { AnswerCommand } from "./arguments.ts";
import { findTable, ownName } from "./findTable.ts";

/** The columns a command speaks of, by their own names in the table they were found in. */
export interface ColumnsAsked {
  readonly table: FoundData;
  readonly outcome: string;
  readonly drivers: readonly string[];
  readonly order: string | null;
  readonly groups: string | null;
}

/** Finds the columns by heading, or by range where the outcome is given as a range. */
export function columnsAsked(host: Host, command: AnswerCommand, errand: Errand): Promise<Result<ColumnsAsked>> {
  return parseAddress(command.outcome) === null ? byHeading(host, command, errand) : byRange(host, command, errand);
}

/** Headings between commas; where the option is repeated each is one heading, commas and all. */
export function headingsIn(values: readonly string[]): string[] {
  const parts = values.length > 1 ? values : (values[0] ?? "").split(",");
  return parts.map((part) => part.trim()).filter((part) => part !== "");
}

async function byHeading(host: Host, command: AnswerCommand, errand: Errand): Promise<Result<ColumnsAsked>> {
  const { sheet, outcome, order, groups } = command;
  const drivers = headingsIn(command.drivers);
  const headings = [outcome, ...drivers, order, groups].filter((heading) => heading !== null);
  const found = await findTable(host, { sheet, headings }, errand);
  if (!found.ok) return found;
  const table = found.value;
  const own = (heading: string | null): string | null => (heading === null ? null : ownName(table, heading));
  return success({
    table,
    outcome: ownName(table, outcome),
    drivers: drivers.map((heading) => ownName(table, heading)),
    order: own(order),
    groups: own(groups),
  });
}

/** Ranges must stand side by side: same sheet, same rows. The rectangle around them is read in one go. */
async function byRange(host: Host, command: AnswerCommand, errand: Errand): Promise<Result<ColumnsAsked>> {
  const texts = [command.outcome, ...headingsIn(command.drivers), command.order, command.groups];
  const given = texts.filter((text) => text !== null);
  const areas = given.map((text) => ({ text, area: parseAddress(text) }));
  const unread = areas.find(({ area }) => area === null);
  if (unread !== undefined) return failure({ code: "bad-address", address: unread.text });
  const ranges = areas.flatMap(({ text, area }) =>
    area === null ? [] : [{ words: text, area: withSheet(area, command.sheet) }],
  );
  const fault = rangesFault(ranges);
  if (fault !== null) return failure(fault);
  const places = ranges.map(({ area }) => area);
  const rectangle = around(places);
  const address = rectangle.sheet === "" ? localAddressOf(rectangle) : addressOf(rectangle);
  const block = await host.read({ kind: "address", address }, errand);
  if (!block.ok) return block;
  const located = readPlaced(block.value);
  if (!located.ok) return located;
  return success(named(located.value, command, places));
}

const withSheet = (area: SheetArea, sheet: string | null): SheetArea => ({
  ...area,
  sheet: area.sheet || (sheet ?? ""),
});

function around(ranges: readonly SheetArea[]): SheetArea {
  const { sheet, row, rows } = ranges[0] ?? { sheet: "", row: 0, rows: 1 };
  const first = Math.min(...ranges.map(({ column }) => column));
  const end = Math.max(...ranges.map(({ column, columns }) => column + columns));
  return { sheet, row, rows, column: first, columns: end - first };
}

function named(table: FoundData, command: AnswerCommand, ranges: readonly SheetArea[]): ColumnsAsked {
  const namesIn = ({ column, columns }: SheetArea): string[] =>
    table.source.columns.flatMap(({ name, place }) =>
      place.column >= column && place.column < column + columns ? [name] : [],
    );
  const drivers = headingsIn(command.drivers).length;
  const [outcome = [], ...rest] = ranges.map(namesIn);
  const keys = rest.slice(drivers);
  const order = command.order === null ? null : (keys[0]?.[0] ?? null);
  const groups = command.groups === null ? null : (keys.at(-1)?.[0] ?? null);
  return { table, outcome: outcome[0] ?? "", drivers: rest.slice(0, drivers).flat(), order, groups };
}
