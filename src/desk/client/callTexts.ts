import type { CallResult } from "../excel/customFunctions.ts";
import type { HostEvent } from "../excel/events.ts";
import { errorMark } from "../workbook/elementTexts.ts";
import type { Call, CallOutcome } from "../workbook/pendingCalls.ts";
import { callFlag, messageType, notice } from "./messages.ts";

/** Longest message in characters; more calls go in further ones. */
const longestMessage = 8_000_000;

const noticeText = (entries: string): string => `{"type":${messageType.notice},"message":{"entries":[${entries}]}}`;

/** The calls as messages to the runtime. Arguments are JSON already, so that a range is spelled out once for many calls. */
export function callTexts(calls: readonly Call[]): readonly string[] {
  const messages: string[] = [];
  let entries: string[] = [];
  let length = 0;
  const send = (): void => {
    if (entries.length > 0) messages.push(noticeText(entries.join(",")));
    [entries, length] = [[], 0];
  };
  for (const call of calls) {
    const flags = (carriesErrors(call) ? callFlag.errorsPass : 0) | (call.cancelable ? callFlag.cancelable : 0);
    const parts = [
      call.id,
      JSON.stringify(call.functionId),
      `[${call.arguments.join(",")}]`,
      JSON.stringify(call.address),
      flags,
      JSON.stringify(call.parameterAddresses),
    ];
    const entry = `{"messageCategory":${notice.functions},"messageType":${notice.call},"message":[${parts.join(",")}]}`;
    if (length + entry.length > longestMessage) send();
    entries.push(entry);
    length += entry.length;
  }
  send();
  return messages;
}

/** Only then need the runtime look through every element, which takes it longer than the call itself. */
const carriesErrors = (call: Call): boolean => call.arguments.some((text) => text.includes(errorMark));

export function cancelText(ids: readonly number[]): string {
  const entries = ids.map((invocationId) => ({
    messageCategory: notice.functions,
    messageType: notice.cancel,
    message: { invocationId },
  }));
  return noticeText(entries.map((entry) => JSON.stringify(entry)).join(","));
}

export function eventText({ kind, target, details }: HostEvent): string {
  const entry = {
    messageCategory: notice.events,
    messageType: kind,
    targetId: target,
    message: JSON.stringify(details),
  };
  return noticeText(JSON.stringify(entry));
}

/** The runtime's kinds of error as signs; a function that threw, or is not associated, has no kind of its own. */
const errorSigns: Readonly<Record<number, string>> = {
  1: "#N/A",
  5: "#DIV/0!",
  6: "#NUM!",
  7: "#VALUE!",
  8: "#NULL!",
  9: "#NAME?",
  10: "#NAME?",
};

/** Kinds whose message Excel shows beside the error. */
const spoken = ["#VALUE!", "#N/A"];

export function outcomeOf([, succeeded, value, kind]: CallResult): CallOutcome {
  if (succeeded) return { value };
  const error = errorSigns[typeof kind === "number" ? kind : 0] ?? "#VALUE!";
  const isOwn = typeof kind === "number" && kind in errorSigns;
  const message = isOwn && spoken.includes(error) && typeof value === "string" ? value : "";
  return { error, message };
}
