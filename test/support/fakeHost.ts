import type { Errand } from "../../src/app/errand.ts";
import type { DataPlace, Host, PlacedBlock, WhereToRead } from "../../src/app/host.ts";
import { type Problem } from "../../src/core/problem/problem.ts";
import { type Result, failure, success } from "../../src/core/problem/result.ts";
import type { Book } from "../../src/core/review/book.ts";
import type { Cell } from "../../src/core/table/cells.ts";
import { addressOf } from "../../src/core/table/address.ts";
import { namePrefix } from "../../src/app/keeper.ts";
import type { SheetPlan } from "../../src/sheet/plan.ts";
import { type FakeKeeper, fakeKeeper } from "./fakeKeeper.ts";
import { toCellColumn } from "./cellColumns.ts";

/** A spreadsheet of one sheet, in memory, that does as it is told: for the pane's own tests. */
export interface FakeHost extends Host {
  readonly keeper: FakeKeeper;
  /** Rows of the sheet (from 0) that it does not show. */
  hiddenRows: readonly number[];
  /** Row by row, headings first. */
  rows: Cell[][];
  readonly sheet: string;
  readonly places: DataPlace[];
  /** What a review reads. */
  book: Book;
  /** What the next call of each kind answers instead of what was asked. */
  readonly refusals: Partial<Record<"read" | "write" | "goTo" | "watch" | "recalculate" | "keep", Problem>>;
  /** Whether it carries on as if nothing had been cancelled. */
  heedless: boolean;
  /** Holds readings back until it is called. */
  hold: (() => Promise<void>) | null;
  readonly plans: SheetPlan[];
  readonly gone: string[];
  readonly watched: () => readonly string[];
  /** Everyone who ever asked to be told of changes, those who no longer listen included. */
  readonly listeners: ((address: string) => void)[];
  readonly change: (row: number, column: number, cell: Cell) => void;
}

export function fakeHost(sheet: string, rows: Cell[][]): FakeHost {
  const watches = new Set<{ readonly addresses: readonly string[]; readonly tell: (address: string) => void }>();
  const refused = <T>(kind: keyof FakeHost["refusals"], value: T): Result<T> => {
    const problem = host.refusals[kind];
    return problem === undefined ? success(value) : failure(problem);
  };
  const inFront = (): string => host.plans.at(-1)?.name ?? sheet;
  const keeper = fakeKeeper();
  const host: FakeHost = {
    ...keeper,
    keeper,
    hiddenRows: [],
    sheet,
    rows,
    places: [],
    book: { sheets: [], names: [], calculation: "automatic" },
    refusals: {},
    heedless: false,
    hold: null,
    plans: [],
    gone: [],
    watched: () => [...watches].flatMap(({ addresses }) => addresses),
    listeners: [],
    change: (row, column, cell) => {
      host.rows = host.rows.map((cells, r) => cells.map((old, c) => (r === row && c === column ? cell : old)));
      const cellName = addressOf({ sheet, row, column, rows: 1, columns: 1 });
      for (const { tell } of watches) tell(cellName);
    },
    read: async (where: WhereToRead, errand: Errand) => {
      errand.progress({ what: "Reading the cells", share: 0.25 });
      await host.hold?.();
      if (where.kind === "place" && where.place.name.startsWith(namePrefix) && !keeper.names.has(where.place.name))
        return failure({ code: "unknown-place", place: where.place.name, nearest: null });
      return errand.signal.aborted && !host.heedless
        ? failure({ code: "cancelled" })
        : refused("read", blockOf(host, where));
    },
    readBook: () => Promise.resolve(refused("read", host.book)),
    listPlaces: () => Promise.resolve(success(host.places)),
    write: (plan) => {
      host.plans.push(plan);
      const name = `${plan.name}${host.plans.length > 1 ? ` ${host.plans.length}` : ""}`;
      if (host.refusals.write === undefined && plan.holds === undefined) keeper.tags.set(name, null);
      return Promise.resolve(refused("write", { sheet: name }));
    },
    recalculateSheet: () => Promise.resolve(refused("recalculate", { sheet: inFront() })),
    keepSheet: () => Promise.resolve(refused("keep", { sheet: inFront() })),
    goTo: (address) => {
      host.gone.push(address);
      return Promise.resolve(refused("goTo", null));
    },
    watch: (addresses, changed) => {
      const own = { addresses, tell: changed };
      watches.add(own);
      host.listeners.push(changed);
      const stop = (): Promise<void> => {
        watches.delete(own);
        return Promise.resolve();
      };
      return Promise.resolve(refused("watch", stop));
    },
  };
  return host;
}

function blockOf({ sheet, rows, hiddenRows }: FakeHost, where: WhereToRead): PlacedBlock {
  const columns = Math.max(...rows.map((cells) => cells.length));
  const address =
    where.kind === "address" ? where.address : addressOf({ sheet, row: 0, column: 0, rows: rows.length, columns });
  return {
    sheet,
    firstRow: 0,
    firstColumn: 0,
    rowCount: rows.length,
    hiddenRows,
    columns: Array.from({ length: columns }, (_, column) => toCellColumn(rows.map((cells) => cells[column] ?? null))),
    address,
    table: where.kind === "place" && where.place.kind === "table" ? where.place.name : null,
  };
}
