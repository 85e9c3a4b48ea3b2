import type { Analyst } from "../app/analyst.ts";
import { fingerprint, textFingerprint } from "../app/fingerprint.ts";
import type { Answer } from "../core/answer/answer.ts";
import { modelOf } from "../core/answer/modelOf.ts";
import type { Question } from "../core/answer/question.ts";
import { type Result, success } from "../core/problem/result.ts";
import { fitCache } from "./fitCache.ts";
import { readData } from "./readData.ts";
import { readSettingsArgument } from "./readSettings.ts";
import type { Answering } from "./register.ts";
import { type CallValues, plainReplies, replies } from "./replies.ts";

/** More regressions than a workbook has on its busiest sheet; an answer takes some 100 kB. */
const mostAnswers = 100;

/** Answers calls; all that ask about the same cells with the same settings share one analysis. */
export function answerer(analyst: Analyst): Answering {
  const share = fitCache<Answer>(mostAnswers);
  return async (id, values, signal) => {
    if (isOverData(id)) {
      const question = questionOf(values);
      if (!question.ok) return question;
      const key = await keyOf(question.value);
      const answer = await share(key, signal, (stop) =>
        analyst.analyse(question.value, { signal: stop, progress: () => undefined }),
      );
      return answer.ok ? replies[id](answer.value, values) : answer;
    }
    if (isPlain(id)) return plainReplies[id](values);
    throw new Error(`There is no function ${id}.`);
  };
}

const isOverData = (id: string): id is keyof typeof replies => Object.hasOwn(replies, id);
const isPlain = (id: string): id is keyof typeof plainReplies => Object.hasOwn(plainReplies, id);

function questionOf(values: CallValues): Result<Question> {
  const settings = readSettingsArgument(values["settings"]);
  if (!settings.ok) return settings;
  const data = readData(values);
  if (!data.ok) return data;
  const model = modelOf(settings.value, data.value.parts);
  if (!model.ok) return model;
  return success({ source: data.value.source, model: model.value, options: settings.value.options });
}

/** The content of the cells, where they stand in the arguments, and everything that was chosen. */
async function keyOf({ source, model, options }: Question): Promise<string> {
  const places = source.columns.map(({ place }) => place);
  return textFingerprint(JSON.stringify([await fingerprint(source.columns), places, model, options]));
}
