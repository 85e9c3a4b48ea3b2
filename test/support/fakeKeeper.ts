import { type Keeper, type KeptPart, type Over, namePrefix } from "../../src/app/keeper.ts";
import type { Problem } from "../../src/core/problem/problem.ts";
import { failure, success } from "../../src/core/problem/result.ts";
import type { SheetPlan } from "../../src/sheet/plan.ts";

/** What a workbook keeps for Footing, in memory, that does as it is told. */
export interface FakeKeeper extends Keeper {
  parts: KeptPart[];
  /** Addresses by the names they were given. */
  readonly names: Map<string, string>;
  /** Records by the names of the sheets that Footing wrote. */
  readonly tags: Map<string, string | null>;
  readonly rewrites: { readonly plan: SheetPlan; readonly over: Over }[];
  /** What the next rewriting is refused with. */
  rewriteRefusal: Problem | null;
}

export function fakeKeeper(): FakeKeeper {
  const keeper: FakeKeeper = {
    parts: [],
    names: new Map(),
    tags: new Map(),
    rewrites: [],
    rewriteRefusal: null,
    readParts: () => Promise.resolve(success(keeper.parts)),
    writePart: (id, xml) => {
      const known = keeper.parts.some((part) => part.id === id);
      keeper.parts = known
        ? keeper.parts.map((part) => (part.id === id ? { id: part.id, xml } : part))
        : [...keeper.parts, { id: `{part-${keeper.parts.length + 1}}`, xml }];
      return Promise.resolve(success(null));
    },
    nameCells: (address) => {
      const known = [...keeper.names].find(([, named]) => named === address)?.[0];
      const name = known ?? `${namePrefix}${keeper.names.size + 1}`;
      keeper.names.set(name, address);
      return Promise.resolve(success({ name }));
    },
    forgetName: (name) => {
      keeper.names.delete(name);
      return Promise.resolve(success(null));
    },
    resultSheets: () => Promise.resolve(success([...keeper.tags].map(([sheet, record]) => ({ sheet, record })))),
    tagSheet: (sheet, record) => {
      keeper.tags.set(sheet, record);
      return Promise.resolve(success(null));
    },
    rewrite: (plan, over) => {
      const { rewriteRefusal } = keeper;
      if (rewriteRefusal !== null) return Promise.resolve(failure(rewriteRefusal));
      keeper.rewrites.push({ plan, over });
      return Promise.resolve(success({ sheet: over.sheet }));
    },
  };
  return keeper;
}
