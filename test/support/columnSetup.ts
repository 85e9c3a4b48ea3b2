import type { ColumnSetup } from "../../src/app/setup.ts";

/** A column as the pane proposes it, but for what is said here. */
export const columnSetup = (column: string, said: Partial<ColumnSetup> = {}): ColumnSetup => ({
  column,
  role: "unused",
  guessed: true,
  as: "number",
  base: null,
  transform: { kind: "none" },
  also: { kind: "none" },
  unit: "",
  against: 0,
  textNumbers: null,
  ...said,
});
