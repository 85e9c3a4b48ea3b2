import { findRegressions } from "../app/review/findRegressions.ts";
import { reviewEach } from "../app/review/reviewEach.ts";
import { reviewFactsOf } from "../app/review/reviewFacts.ts";
import { nearestName } from "../core/problem/nearestName.ts";
import type { Problem } from "../core/problem/problem.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import type { BookReview } from "../core/review/claimReview.ts";
import type { Asked } from "../core/review/claimsOf.ts";
import { reviewText } from "../core/review/reviewText.ts";
import { changesConclusion } from "../core/review/reviewWords.ts";
import { addressOf, parseAddress } from "../core/table/address.ts";
import { plainHeading } from "../core/table/headingRow.ts";
import { cautionLine } from "../sheet/plainWordsSection.ts";
import { planReview } from "../sheet/reviewSheet.ts";
import { type Surroundings, quiet } from "./answerCommand.ts";
import type { OpenBook } from "./deskBook.ts";
import { type BookFile, openBookFile } from "./bookFile.ts";
import { headingsIn } from "./columnsAsked.ts";
import type { ReviewCommand } from "./reviewArguments.ts";
import { reviewJson } from "./reviewJson.ts";
import { forms, saveCopy } from "./saveCopy.ts";
import { saveFault } from "./saveName.ts";
import { wrapped } from "./wrapped.ts";

/** What was printed, and whether a finding changes a conclusion. */
export interface Reviewed {
  readonly out: string;
  readonly changesConclusion: boolean;
}

/** Carries out `footing review`. */
export async function reviewCommand(command: ReviewCommand, world: Surroundings): Promise<Result<Reviewed>> {
  const fault = saveFault(command);
  if (fault !== null) return failure(fault);
  const file = await openBookFile(command.book, world.files);
  if (!file.ok) return file;
  const asked = askedOf(command, file.value);
  if (!asked.ok) return asked;
  const opened = await world.openBook(file.value.book);
  const done = await reviewIn(opened, asked.value, { file: file.value, command, world });
  opened.close();
  return done;
}

/** What the command asks of the book; a file of values alone can be asked about typed results only. */
function askedOf(command: ReviewCommand, file: BookFile): Result<Asked> {
  const { book, reported, outcome, drivers } = command;
  const known = file.book.sheets.map(({ name }) => name);
  const sheet = known.find((name) => plainHeading(name) === plainHeading(command.sheet ?? "")) ?? null;
  if (sheet === null && command.sheet !== null) {
    return failure({ code: "unknown-place", place: command.sheet, nearest: nearestName(command.sheet, known) });
  }
  if (reported === null) {
    return file.original === null ? failure({ code: "no-formulas", file: book }) : success({ pointed: null, sheet });
  }
  const place = placeOf(reported, sheet ?? onlySheet(file));
  if (place === null) return failure({ code: "missing-option", option: "--sheet, the sheet of the cells reported" });
  const named = headingsIn(drivers);
  return success({ pointed: { reported: place, outcome, drivers: named.length === 0 ? null : named }, sheet });
}

const onlySheet = ({ book }: BookFile): string | null =>
  book.sheets.length === 1 ? (book.sheets[0]?.name ?? null) : null;

/** An address with its sheet; a name stays as it is. Null where the sheet cannot be told. */
function placeOf(reported: string, sheet: string | null): string | null {
  const area = parseAddress(reported);
  if (area === null || area.sheet !== "") return reported;
  return sheet === null ? null : addressOf({ ...area, sheet });
}

interface Task {
  readonly file: BookFile;
  readonly command: ReviewCommand;
  readonly world: Surroundings;
}

async function reviewIn(opened: OpenBook, asked: Asked, { file, command, world }: Task): Promise<Result<Reviewed>> {
  const { analyst } = world;
  const listed = await findRegressions({ host: opened.host, analyst }, asked, quiet);
  if (!listed.ok) return listed;
  const { claims, unread, craft } = listed.value;
  if (claims.length === 0) return failure(nothingToReview(command, unread));
  const reviews = await reviewEach(claims, { analyst, errand: quiet });
  if (!reviews.ok) return reviews;
  const review: BookReview = { claims: reviews.value, unread, craft };
  const saved = await written(review, opened, { file, command, world });
  if (!saved.ok) return saved;
  const out = command.json ? JSON.stringify(reviewJson(review), null, 2) : report(review, saved.value);
  return success({ out, changesConclusion: changesConclusion(review) });
}

/** Problems list ten at most. */
const mostListed = 10;

const nothingToReview = ({ book }: ReviewCommand, unread: BookReview["unread"]): Problem => ({
  code: "nothing-to-review",
  where: book,
  unread: unread.slice(0, mostListed).map(({ cell, why }) => `${cell} (${why.replace(/\.$/, "")})`),
});

/** Writes the review sheet through the same adapter as in Excel, then puts it into a copy of the file. */
async function written(
  review: BookReview,
  opened: OpenBook,
  { file, command, world }: Task,
): Promise<Result<string[]>> {
  const { save } = command;
  if (save === null) return success([]);
  const facts = await reviewFactsOf(
    review.claims.map(({ claim }) => claim),
    world,
  );
  const sheet = await opened.host.write(planReview(review, facts), quiet);
  if (!sheet.ok) return sheet;
  const copy = { opened, file, sheet: sheet.value.sheet, from: command.book, to: save, form: forms.excel };
  const saved = await saveCopy(copy, world.files);
  return saved.ok ? success([`Sheet "${saved.value}" is in ${save}.`]) : saved;
}

const report = (review: BookReview, closing: readonly string[]): string =>
  [
    ...reviewText(review).map(({ kind, words }) => (kind === "table" ? words : wrapped(words))),
    ...closing,
    cautionLine,
  ].join("\n");
