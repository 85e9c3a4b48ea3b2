import type { ClaimedForm, ClaimedLine } from "./claim.ts";

/** What enters a regression for the number in a cell; not finite where the form has none. */
export const formOf: Readonly<Record<ClaimedForm, (value: number) => number>> = {
  "as it is": (value) => value,
  logarithm: Math.log,
  square: (value) => value ** 2,
  cube: (value) => value ** 3,
  // The line's cells are the positions already.
  position: (value) => value,
};

/** Whether a line stands in cells of its own; positions are counted along those of the outcome. */
export const standsInCells = ({ form }: Pick<ClaimedLine, "form">): boolean => form !== "position";
