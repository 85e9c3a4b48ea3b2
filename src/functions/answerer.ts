import type { Analyst, Inquirer } from "../app/analyst.ts";
import { fingerprint, textFingerprint } from "../app/fingerprint.ts";
import type { Answer } from "../core/answer/answer.ts";
import type { Finding, Inquiry } from "../core/answer/inquire.ts";
import { modelOf } from "../core/answer/modelOf.ts";
import type { Question } from "../core/answer/question.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import type { Source } from "../core/table/source.ts";
import { fitCache } from "./fitCache.ts";
import type { FunctionId } from "./functionTable.ts";
import { type Called, inquiries } from "./inquiries.ts";
import { onceFor, readOnce } from "./once.ts";
import { type CalledData, type readData } from "./readData.ts";
import { readSettingsArgument } from "./readSettings.ts";
import { type CallValues, type Reply, plainReplies, replies } from "./replies.ts";

/** How one call is computed: what to show for the function, from the values given, until the signal is raised. */
export type Answering = (id: FunctionId, values: CallValues, signal: AbortSignal) => Promise<Reply>;

/** More regressions than a workbook has on its busiest sheet; an answer takes some 100 kB, a finding up to 1.5 MB. */
const mostAnswers = 100;
const mostFindings = 40;

/** Answers calls; all that ask about the same cells with the same settings share one analysis. */
export function answerer(analyst: Analyst & Inquirer): Answering {
  const shareAnswer = fitCache<Answer>(mostAnswers);
  const shareFinding = fitCache<Finding>(mostFindings);
  const read = readOnce();
  const print = onceFor((columns: Source["columns"]) => fingerprint(columns));
  const look = ({ question, key, signal }: Asked, inquiry: Inquiry): Promise<Result<Finding>> =>
    shareFinding(`${key} ${JSON.stringify(inquiry)}`, signal, (stop) =>
      analyst.inquire(question, inquiry, quietly(stop)),
    );
  return async (id, values, signal) => {
    if (isPlain(id)) return plainReplies[id](values);
    const asked = questionOf(values, read);
    if (!asked.ok) return asked;
    const { data, question } = asked.value;
    const key = await keyOf(question, print);
    const answer = await shareAnswer(key, signal, (stop) => analyst.analyse(question, quietly(stop)));
    if (!answer.ok) return answer;
    if (!isInquiry(id)) return replies[id](answer.value, values);
    const called: Called = { answer: answer.value, data, values };
    const inquiry = inquiries[id].ask(called);
    if (!inquiry.ok) return inquiry;
    const finding = await look({ question, key, signal }, inquiry.value);
    return finding.ok ? inquiries[id].show(finding.value, called) : finding;
  };
}

interface Asked {
  readonly question: Question;
  readonly key: string;
  readonly signal: AbortSignal;
}

/** Nobody watches a cell's progress. */
const quietly = (signal: AbortSignal) => ({ signal, progress: () => undefined });

const isPlain = (id: FunctionId): id is keyof typeof plainReplies => Object.hasOwn(plainReplies, id);
const isInquiry = (id: FunctionId): id is keyof typeof inquiries => Object.hasOwn(inquiries, id);

function questionOf(
  values: CallValues,
  read: typeof readData,
): Result<{ readonly question: Question; readonly data: CalledData }> {
  const settings = readSettingsArgument(values["settings"]);
  if (!settings.ok) return settings;
  const data = read(values);
  if (!data.ok) return data;
  const model = modelOf(settings.value, data.value.parts);
  if (!model.ok) return model;
  const { spanned } = data.value;
  if (spanned !== null && model.value.drivers.some(({ column }) => column === spanned.column)) {
    return failure(spanned.problem);
  }
  const question = { source: data.value.source, model: model.value, options: settings.value.options };
  return success({ question, data: data.value });
}

/** The content of the cells, where they stand in the arguments, and everything that was chosen. */
async function keyOf({ source, model, options }: Question, print: typeof fingerprint): Promise<string> {
  const places = source.columns.map(({ place }) => place);
  return textFingerprint(JSON.stringify([await print(source.columns), places, model, options]));
}
