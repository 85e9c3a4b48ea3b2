import type { Result } from "../core/problem/result.ts";
import type { Book } from "../core/review/book.ts";
import type { CellBlock } from "../core/table/block.ts";
import type { SheetPlan } from "../sheet/plan.ts";
import type { Errand } from "./errand.ts";
import type { Keeper } from "./keeper.ts";

/** A block of cells and where it was found. */
export interface PlacedBlock extends CellBlock {
  /** "Months!A1:D97" */
  readonly address: string;
  /** The table the block is the range of, if any: for structured references. */
  readonly table: string | null;
}

/** A place a user can choose data from. */
export interface DataPlace {
  readonly kind: "table" | "name" | "sheet";
  readonly name: string;
  /** "Months!A1:D97" */
  readonly address: string;
}

export type WhereToRead =
  | { readonly kind: "selection" }
  | { readonly kind: "address"; readonly address: string }
  | { readonly kind: "place"; readonly place: DataPlace };

/** What the app needs of a spreadsheet. The office room answers it with Excel's API. */
export interface Host extends Keeper {
  /** Reads in chunks; a selection of one cell widens to the data around it; whole columns stop at the used range. */
  readonly read: (where: WhereToRead, errand: Errand) => Promise<Result<PlacedBlock>>;
  /** Reads every sheet for a review, with its formulas; the sheets that Footing wrote are left away. */
  readonly readBook: (errand: Errand) => Promise<Result<Book>>;
  readonly listPlaces: () => Promise<Result<readonly DataPlace[]>>;
  /** Writes to a new sheet, shows it, and answers with its name. */
  readonly write: (plan: SheetPlan, errand: Errand) => Promise<Result<{ readonly sheet: string }>>;
  /** Calculates the formulas of the sheet in front again, and answers with its name. */
  readonly recalculateSheet: () => Promise<Result<{ readonly sheet: string }>>;
  /** Puts values in the place of the formulas of the sheet in front, if Footing wrote it and all values are there. */
  readonly keepSheet: (errand: Errand) => Promise<Result<{ readonly sheet: string }>>;
  /** Selects and shows a cell or range. */
  readonly goTo: (address: string) => Promise<Result<null>>;
  /** Calls back when a cell inside one of the addresses changes; answers with a way to stop. */
  readonly watch: (
    addresses: readonly string[],
    changed: (address: string) => void,
  ) => Promise<Result<() => Promise<void>>>;
}
