import type { RowOrder } from "./design.ts";

type Groups = Extract<RowOrder, { kind: "groups" }>;

/** One way of grouping the rows. */
export type Grouped = Pick<Groups, "groups" | "labels" | "by">;

/** The ways in which rows are grouped: one, or two that cross. */
export const groupingsOf = (order: Groups): readonly Grouped[] =>
  order.second === null ? [order] : [order, order.second];

/** How many groups there are, of two ways the fewer. */
export const fewestGroups = (order: Groups): number =>
  Math.min(...groupingsOf(order).map(({ labels }) => labels.length));
