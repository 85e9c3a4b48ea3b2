import type { Analyst, Inquirer, Reviewer } from "../app/analyst.ts";
import { fingerprintOf } from "../app/fingerprint.ts";
import type { Errand } from "../app/errand.ts";
import type { Host } from "../app/host.ts";
import { sheetFactsOf } from "../app/sheetFacts.ts";
import type { Answer } from "../core/answer/answer.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import type { BookData } from "../desk/book/bookData.ts";
import { planAnswer } from "../sheet/answerSheet.ts";
import type { AnswerCommand } from "./arguments.ts";
import { answerJson } from "./answerJson.ts";
import { type BookFile, openBookFile } from "./bookFile.ts";
import type { FileAccess } from "./fileAccess.ts";
import { type Predicted, predictionLines, predictionsOf } from "./predictions.ts";
import { type Asked, questionOf } from "./question.ts";
import type { OpenBook } from "./deskBook.ts";
import { report } from "./report.ts";
import { forms, saveCopy } from "./saveCopy.ts";
import { saveFault } from "./saveName.ts";

/** What the command needs of the world outside. */
export interface Surroundings {
  readonly files: FileAccess;
  readonly openBook: (book: BookData) => Promise<OpenBook>;
  readonly analyst: Analyst & Inquirer & Reviewer;
  readonly today: () => string;
  readonly version: string;
}

export const quiet: Errand = { signal: new AbortController().signal, progress: () => undefined };

/** Carries out `footing answer`. @returns what is printed on standard output. */
export async function answerCommand(command: AnswerCommand, world: Surroundings): Promise<Result<string>> {
  const fault = saveFault(command);
  if (fault !== null) return failure(fault);
  const file = await openBookFile(command.book, world.files);
  if (!file.ok) return file;
  const opened = await world.openBook(file.value.book);
  const answered = await answerIn(opened, command, world);
  if (!answered.ok) return answered;
  const { asked, answer } = answered.value;
  const predicted = await predictionsFor(answered.value, command, { ...world, host: opened.host });
  if (!predicted.ok) return predicted;
  const saved =
    command.save === null ? success(null) : await save({ opened, asked, answer, file: file.value, command }, world);
  opened.close();
  if (!saved.ok) return saved;
  const savedAs = saved.value === null ? [] : [`Sheet "${saved.value}" is in ${command.save ?? ""}.`];
  const lines = predicted.value === null ? [] : predictionLines(predicted.value);
  return success(
    command.json
      ? JSON.stringify(answerJson(answer, predicted.value), null, 2)
      : report(answer, [...lines, ...savedAs]),
  );
}

async function predictionsFor(
  { asked, answer }: Answered,
  { predict, sheet }: AnswerCommand,
  { host, analyst }: { readonly host: Host; readonly analyst: Inquirer },
): Promise<Result<Predicted | null>> {
  if (predict === null) return success(null);
  return predictionsOf({ place: predict, sheet, asked, answer }, { host, analyst, errand: quiet });
}

interface Answered {
  readonly asked: Asked;
  readonly answer: Answer;
}

async function answerIn(
  opened: OpenBook,
  command: AnswerCommand,
  { analyst }: Surroundings,
): Promise<Result<Answered>> {
  const asked = await questionOf(opened.host, command, quiet);
  if (!asked.ok) return asked;
  const answer = await analyst.analyse(asked.value.question, quiet);
  return answer.ok ? success({ asked: asked.value, answer: answer.value }) : answer;
}

interface Saving extends Answered {
  readonly opened: OpenBook;
  readonly file: BookFile;
  readonly command: AnswerCommand;
}

/** Writes the result sheet through the same adapter as in Excel, then puts it into a copy of the file. */
async function save({ opened, asked, answer, file, command }: Saving, world: Surroundings): Promise<Result<string>> {
  const { question, table } = asked;
  const made = {
    date: world.today(),
    version: world.version,
    fingerprint: await fingerprintOf(question),
    headingRow: table.headingRow,
    table: table.table,
  };
  const plan = planAnswer(answer, sheetFactsOf(question, made), command.live ? "live" : "kept");
  const written = await opened.host.write(plan, quiet);
  if (!written.ok) return written;
  const { sheet } = written.value;
  const form = command.forLibreOffice ? forms.libreOffice : forms.excel;
  return saveCopy({ opened, file, sheet, from: command.book, to: command.save ?? "", form }, world.files);
}
