import type { DataPlace, Errand, Host, PlacedBlock, WhereToRead } from "../../src/app/host.ts";
import { type Problem } from "../../src/core/problem/problem.ts";
import { type Result, failure, success } from "../../src/core/problem/result.ts";
import type { Book } from "../../src/core/review/book.ts";
import { type Cell, toCellColumn } from "../../src/core/table/cells.ts";
import { addressOf } from "../../src/core/table/address.ts";
import type { SheetPlan } from "../../src/sheet/plan.ts";

/** A spreadsheet of one sheet, in memory, that does as it is told: for the pane's own tests. */
export interface FakeHost extends Host {
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
  let watched: readonly string[] = [];
  let tell: (address: string) => void = () => undefined;
  const refused = <T>(kind: keyof FakeHost["refusals"], value: T): Result<T> => {
    const problem = host.refusals[kind];
    return problem === undefined ? success(value) : failure(problem);
  };
  const inFront = (): string => host.plans.at(-1)?.name ?? sheet;
  const host: FakeHost = {
    sheet,
    rows,
    places: [],
    book: { sheets: [], names: [], calculation: "automatic" },
    refusals: {},
    heedless: false,
    hold: null,
    plans: [],
    gone: [],
    watched: () => watched,
    listeners: [],
    change: (row, column, cell) => {
      host.rows = host.rows.map((cells, r) => cells.map((old, c) => (r === row && c === column ? cell : old)));
      if (watched.length > 0) tell(addressOf({ sheet, row, column, rows: 1, columns: 1 }));
    },
    read: async (where: WhereToRead, errand: Errand) => {
      errand.progress({ what: "Reading the cells", share: 0.25 });
      await host.hold?.();
      return errand.signal.aborted && !host.heedless
        ? failure({ code: "cancelled" })
        : refused("read", blockOf(host, where));
    },
    readBook: () => Promise.resolve(refused("read", host.book)),
    listPlaces: () => Promise.resolve(success(host.places)),
    write: (plan) => {
      host.plans.push(plan);
      return Promise.resolve(
        refused("write", { sheet: `${plan.name}${host.plans.length > 1 ? ` ${host.plans.length}` : ""}` }),
      );
    },
    recalculateSheet: () => Promise.resolve(refused("recalculate", { sheet: inFront() })),
    keepSheet: () => Promise.resolve(refused("keep", { sheet: inFront() })),
    goTo: (address) => {
      host.gone.push(address);
      return Promise.resolve(refused("goTo", null));
    },
    watch: (addresses, changed) => {
      watched = addresses;
      tell = changed;
      host.listeners.push(changed);
      const stop = (): Promise<void> => {
        watched = [];
        return Promise.resolve();
      };
      return Promise.resolve(refused("watch", stop));
    },
  };
  return host;
}

function blockOf({ sheet, rows }: FakeHost, where: WhereToRead): PlacedBlock {
  const columns = Math.max(...rows.map((cells) => cells.length));
  const address =
    where.kind === "address" ? where.address : addressOf({ sheet, row: 0, column: 0, rows: rows.length, columns });
  return {
    sheet,
    firstRow: 0,
    firstColumn: 0,
    rowCount: rows.length,
    columns: Array.from({ length: columns }, (_, column) => toCellColumn(rows.map((cells) => cells[column] ?? null))),
    address,
    table: where.kind === "place" && where.place.kind === "table" ? where.place.name : null,
  };
}
