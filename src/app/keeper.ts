import type { Result } from "../core/problem/result.ts";
import type { SheetPlan } from "../sheet/plan.ts";
import type { WrittenBlock } from "../sheet/written.ts";
import type { Errand } from "./errand.ts";

/** An XML part of the workbook, which travels with the file. */
export interface KeptPart {
  readonly id: string;
  readonly xml: string;
}

/** A sheet that Footing wrote, and the name of what is known of it, if anything is. */
export interface ResultSheet {
  readonly sheet: string;
  readonly record: string | null;
}

/** Stands before the number of every name that is given to cells. */
export const namePrefix = "Footing_data_";

/** What the app needs of a spreadsheet to keep things of its own in the workbook, and to write over what it wrote. */
export interface Keeper {
  readonly readParts: (namespace: string) => Promise<Result<readonly KeptPart[]>>;
  /** Changes the part of that id; null adds a part. */
  readonly writePart: (id: string | null, xml: string) => Promise<Result<null>>;
  /** A name of the workbook for the cells, which moves with them; the one they were given before, if any. */
  readonly nameCells: (address: string) => Promise<Result<{ readonly name: string }>>;
  /** Takes away a name that `nameCells` gave; names of the user's own stay. */
  readonly forgetName: (name: string) => Promise<Result<null>>;
  readonly resultSheets: () => Promise<Result<readonly ResultSheet[]>>;
  readonly tagSheet: (sheet: string, record: string) => Promise<Result<null>>;
  /** Writes a plan in the place of what stands on a sheet, if all of that is Footing's own. */
  readonly rewrite: (plan: SheetPlan, over: Over, errand: Errand) => Promise<Result<{ readonly sheet: string }>>;
}

/** What a plan is written over: a sheet, and what Footing wrote there before. */
export interface Over {
  readonly sheet: string;
  readonly written: readonly WrittenBlock[];
}
