import type { Claim } from "../../core/review/claim.ts";
import type { Work } from "../work.ts";
import { pointAtSelection, reviewAgain, reviewBook, reviewPointed, reviewRest, reviewSelection } from "./reviewing.ts";
import type { Pointing } from "./reviewState.ts";
import { takeOverRegression } from "./takeOver.ts";
import { writeReview } from "./writeReview.ts";

/** What a person can ask of the review. */
export interface ReviewCommands {
  /** Lists every regression of the workbook and reviews each. */
  readonly book: () => void;
  /** Reviews what the selected cells report. */
  readonly selection: () => void;
  /** Reviews what is pointed at, with what is said of its data. */
  readonly pointed: () => void;
  /** The same again, as the cells stand now. */
  readonly again: () => void;
  /** Goes on with those that are not reviewed yet. */
  readonly rest: () => void;
  /** Puts the address of the selected cells into a field. */
  readonly point: (field: keyof Pointing) => void;
  readonly write: () => void;
  /** Reads the data of a regression into the Data section. */
  readonly takeOver: (claim: Claim) => void;
}

export const reviewCommands = (work: Work, guard: (task: () => Promise<void>) => void): ReviewCommands => ({
  book: () => guard(() => reviewBook(work)),
  selection: () => guard(() => reviewSelection(work)),
  pointed: () => guard(() => reviewPointed(work)),
  again: () => guard(() => reviewAgain(work)),
  rest: () => guard(() => reviewRest(work)),
  point: (field) => guard(() => pointAtSelection(work, field)),
  write: () => guard(() => writeReview(work)),
  takeOver: (claim) => guard(() => takeOverRegression(work, claim)),
});
