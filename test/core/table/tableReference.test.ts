import { expect, it } from "vitest";
import { readTableReference } from "../../../src/core/table/tableReference.ts";

// After the grammar of structure-reference, [MS-XLSX] 2.2.2; a sign behind an apostrophe is a letter.
it.each([
  ["", [], []],
  ["Price", [], ["Price"]],
  ["#Headers", ["#headers"], []],
  ["[#Data],[Price]:[Rain]", ["#data"], ["Price", "Rain"]],
  ["[#Headers],[#Data],[Price]", ["#headers", "#data"], ["Price"]],
  ["[ Price index ]", [], ["Price index"]],
  ["@Price", ["#this row"], ["Price"]],
  ["@[Price]:[Rain]", ["#this row"], ["Price", "Rain"]],
  ["@", ["#this row"], []],
  ["[Cost '[EUR']],[It''s]", [], ["Cost [EUR]", "It's"]],
  ["'#1 shop", [], ["#1 shop"]],
])("[%s] speaks of its items and columns", (inside, items, columns) => {
  expect(readTableReference(inside)).toEqual({ items, columns });
});
