import type { Model } from "../design/model.ts";
import type { Source } from "../table/source.ts";
import type { Options } from "./options.ts";

/** What is asked: the columns, what is made of them, and how the answer is to be made. */
export interface Question {
  readonly source: Source;
  readonly model: Model;
  readonly options: Options;
}

/** How far an analysis has come, said between its steps; the share runs from 0 to 1. */
export type Report = (step: string, share: number) => void;
