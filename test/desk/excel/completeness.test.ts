import { afterAll, beforeAll, describe, expect, it } from "vitest";
import type { NodeDesk } from "../../../src/desk/client/openDesk.ts";
import { families } from "../../../src/desk/excel/families.ts";
import { testDesk } from "../../support/desk.ts";

let desk: NodeDesk;
beforeAll(async () => {
  desk = await testDesk();
});
afterAll(() => desk.close());

/** What the vendor's client says of one of its classes. */
interface ClientClass {
  readonly prototype: Readonly<Record<string, unknown>>;
}

const inner = ["_ReferenceId", "_Id"];

describe("every plain property that the client knows of a type", () => {
  it.each(Object.keys(families).filter((type) => type !== "CustomFunctions"))(
    "is answered or refused by %s",
    (type) => {
      const known = (desk.Excel as unknown as Record<string, ClientClass>)[type]?.prototype;
      expect(known, `the client has no class ${type}`).toBeDefined();
      const scalars = (known?.["_scalarPropertyOriginalNames"] ?? []) as readonly string[];
      const family = families[type as keyof typeof families];
      const told = new Set([...Object.keys(family.read ?? {}), ...(family.lacks ?? [])]);
      expect(scalars.filter((name) => !told.has(name) && !inner.includes(name))).toEqual([]);
      const strange = [...told].filter((name) => !scalars.includes(name) && name !== "Count");
      expect(strange).toEqual([]);
    },
  );
});
