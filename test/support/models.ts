import type { DriverChoice, Model } from "../../src/core/design/model.ts";

/** A driver read as a number, as it stands, unless said otherwise. */
export const driver = (column: string, choice: Partial<DriverChoice> = {}): DriverChoice => ({
  column,
  as: "number",
  base: null,
  transform: { kind: "none" },
  ...choice,
});

/** Repairs explained by Price over separate cases, with a constant, unless said otherwise. */
export const modelWith = (parts: Partial<Model> = {}): Model => ({
  outcome: { column: "Repairs", transform: { kind: "none" } },
  drivers: [driver("Price")],
  calendar: [],
  rows: { kind: "cases" },
  constant: true,
  textNumbers: [],
  ...parts,
});
