import { execute, type RequestBody } from "../excel/execute.ts";
import { fault, isFault, type HostFault } from "../excel/fault.ts";
import type { Host } from "../excel/host.ts";
import { delayForCellEdit, messageType, type BridgeRequest } from "./messages.ts";
import type { Transport } from "./transport.ts";

/** Excel on the web carries no more in one request or response; the desktop knows no such limit. */
const webLimit = 5 * 1024 * 1024;

export interface Server {
  /** Called when the add-in's runtime has started, and again when it has started anew. */
  readonly onReady: (listener: () => void) => void;
  /** Begins to answer; what came before waits. */
  readonly answer: (host: Host) => void;
  /** Sends a notice, but never ahead of the answer to the request that brought it about. */
  readonly after: (text: string) => void;
  readonly busy: () => boolean;
}

/** Takes requests in the order in which they come, one at a time. */
export function serveRequests(line: Transport): Server {
  const notices: string[] = [];
  let begin: (host: Host) => void = () => undefined;
  let last: Promise<void> = Promise.resolve();
  const started = new Promise<Host>((resolve) => (begin = resolve));
  let working = 0;
  let heardReady: () => void = () => undefined;
  line.receive((text) => {
    const request = JSON.parse(text) as BridgeRequest;
    if (request.type === messageType.ready) heardReady();
    if (request.type !== messageType.request) return;
    working += 1;
    last = last.then(async () => {
      line.send(await respond(await started, request, text.length));
      working -= 1;
      notices.splice(0).forEach(line.send);
    });
  });
  return {
    onReady: (listener) => {
      heardReady = listener;
    },
    answer: begin,
    after: (text) => (working > 0 ? void notices.push(text) : line.send(text)),
    busy: () => working > 0,
  };
}

async function respond(host: Host, request: BridgeRequest, length: number): Promise<string> {
  try {
    const body = request.message.body as RequestBody;
    ensureSize(host, length, "RequestPayloadSizeLimitExceeded");
    await ensureNotEditing(host, request);
    const done = await execute(host, body);
    host.events.settle();
    const text = envelope(request.id, 200, done);
    ensureSize(host, text.length, "ResponsePayloadSizeLimitExceeded");
    return text;
  } catch (error) {
    const told = isFault(error) ? error : fault("GeneralException", String(error));
    return envelope(request.id, 400, { error: faultBody(told) });
  }
}

const faultBody = ({ code, message }: HostFault): object => ({ code, message });

function envelope(id: number, statusCode: number, body: object): string {
  return JSON.stringify({ id, type: messageType.response, message: { statusCode, headers: {}, body } });
}

function ensureSize(
  { switches }: Host,
  length: number,
  code: "RequestPayloadSizeLimitExceeded" | "ResponsePayloadSizeLimitExceeded",
): void {
  if (switches.profile === "web" && length > webLimit) throw fault(code);
}

/** While a cell is being edited Excel refuses requests, or holds those back that are willing to wait. */
async function ensureNotEditing({ switches }: Host, { flags = 0, message }: BridgeRequest): Promise<void> {
  if (!switches.editing || isFunctionResult(message.body as RequestBody)) return;
  if ((flags & delayForCellEdit) === 0) throw fault("InvalidOperationInCellEditMode");
  await finished(switches);
}

async function finished(switches: Host["switches"]): Promise<void> {
  if (!switches.editing) return;
  await new Promise((resolve) => setTimeout(resolve, pollMilliseconds));
  await finished(switches);
}

const pollMilliseconds = 10;

const isFunctionResult = ({ Actions }: RequestBody): boolean => Actions.some(({ Name }) => Name.includes("Invocation"));
