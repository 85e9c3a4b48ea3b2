import type { CallResult } from "../excel/host.ts";
import type { HostEvent } from "../excel/events.ts";
import { errorMark } from "../workbook/elementTexts.ts";
import type { Call, CallOutcome } from "../workbook/pendingCalls.ts";
import { callFlag, messageType, notice, type TravellingCall } from "./messages.ts";

/** Longest message in characters; more calls go in further ones. */
const longestMessage = 8_000_000;

const noticeText = (entries: string): string => `{"type":${messageType.notice},"message":{"entries":[${entries}]}}`;

/** The calls as messages to the runtime. Arguments are JSON already; each stands in its message once. */
export function callTexts(calls: readonly Call[]): readonly string[] {
  const messages: string[] = [];
  let message = emptyMessage();
  for (const call of calls) {
    const added = call.arguments.reduce((sum, text) => sum + (message.places.has(text) ? 0 : text.length), 0);
    if (message.calls.length > 0 && message.length + added > longestMessage) {
      messages.push(textOf(message));
      message = emptyMessage();
    }
    add(message, call);
  }
  if (message.calls.length > 0) messages.push(textOf(message));
  return messages;
}

interface Message {
  /** The values in JSON, each with its place. */
  readonly places: Map<string, number>;
  readonly calls: TravellingCall[];
  /** Values that hold errors: only then need the runtime look through every element, which takes it longer than the call. */
  readonly erroneous: Set<number>;
  length: number;
}

const emptyMessage = (): Message => ({ places: new Map(), calls: [], erroneous: new Set(), length: 0 });

function add(message: Message, { id, functionId, cancelable, address, parameterAddresses, ...call }: Call): void {
  const values = call.arguments.map((text) => placeOf(message, text));
  const carriesErrors = values.some((place) => message.erroneous.has(place));
  const flags = (carriesErrors ? callFlag.errorsPass : 0) | (cancelable ? callFlag.cancelable : 0);
  message.calls.push([id, functionId, values, address, flags, parameterAddresses]);
}

function placeOf(message: Message, text: string): number {
  const known = message.places.get(text);
  if (known !== undefined) return known;
  const place = message.places.size;
  message.places.set(text, place);
  message.length += text.length;
  if (text.includes(errorMark)) message.erroneous.add(place);
  return place;
}

const textOf = ({ places, calls }: Message): string =>
  `{"type":${messageType.calls},"calls":${JSON.stringify(calls)},"values":[${[...places.keys()].join(",")}]}`;

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
