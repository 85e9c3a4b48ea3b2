import type { Answer } from "../core/answer/answer.ts";
import { counted } from "../core/problem/spots.ts";
import type { DataInHand } from "./dataInHand.ts";
import type { PaneState, Written } from "./state.ts";

/** Tells screen readers something, once each time it happens. */
export const announce = (state: PaneState, text: string): PaneState => ({
  ...state,
  said: { text, count: state.said.count + 1 },
});

export const readWords = ({ address, source }: DataInHand): string =>
  `Read ${counted(source.rowCount, "row")} and ${counted(source.columns.length, "column")} from ${address}.`;

export const answeredWords = ({ verdict }: Answer): string => `The answer is ready. ${verdict.join(" ")}`;

export const changedWords = (cell: string): string => `${cell} has changed. The answer is out of date.`;

export const recalculatedWords = (sheet: string): string =>
  `The functions on the sheet ${sheet} are being calculated again.`;

export const keptWords = (sheet: string): string => `The sheet ${sheet} is kept now: it holds values that stay.`;

export const writtenWords = ({ sheet, kind }: Written): string =>
  `Written to the sheet ${sheet}, ${kind === "live" ? "as formulas that follow the cells" : "as values that stay"}.`;
