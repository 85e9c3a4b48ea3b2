import type { SheetArea } from "../../table/address.ts";

/** A formula as it is meant. */
export type Formula =
  | { readonly kind: "number"; readonly value: number }
  | { readonly kind: "text"; readonly value: string }
  | { readonly kind: "boolean"; readonly value: boolean }
  | { readonly kind: "error"; readonly sign: string }
  /** An argument left away between commas. */
  | { readonly kind: "missing" }
  | { readonly kind: "array"; readonly rows: readonly (readonly Formula[])[] }
  /** The sheet is empty where none is named. */
  | { readonly kind: "cells"; readonly area: SheetArea }
  | { readonly kind: "name"; readonly sheet: string | null; readonly name: string }
  | { readonly kind: "structured"; readonly table: string; readonly inside: string }
  | { readonly kind: "spill"; readonly of: Formula }
  | { readonly kind: "call"; readonly name: string; readonly arguments: readonly Formula[] }
  | { readonly kind: "prefix"; readonly sign: "+" | "-" | "@"; readonly of: Formula }
  | { readonly kind: "percent"; readonly of: Formula }
  | { readonly kind: "operation"; readonly sign: string; readonly left: Formula; readonly right: Formula };

/** Whether any part of a formula is of a sort. */
export function contains(formula: Formula, isSought: (part: Formula) => boolean): boolean {
  return isSought(formula) || partsOf(formula).some((part) => contains(part, isSought));
}

function partsOf(formula: Formula): readonly Formula[] {
  switch (formula.kind) {
    case "array":
      return formula.rows.flat();
    case "call":
      return formula.arguments;
    case "spill":
    case "prefix":
    case "percent":
      return [formula.of];
    case "operation":
      return [formula.left, formula.right];
    default:
      return [];
  }
}
