import type { Source } from "../core/table/source.ts";
import type { FromWorker, WorkerLine } from "./protocol.ts";
import type { Asked, TaskName } from "./tasks.ts";

/** One worker in its place: asked one thing at a time, and left for good when it must stop. */
export interface Seat {
  readonly ask: (job: number, task: TaskName, asked: Asked<TaskName>) => void;
  readonly leave: () => void;
}

/** What is heard from it; `lost` tells whether it had ever started. */
export interface Ears {
  readonly message: (message: FromWorker) => void;
  readonly lost: (fault: Error, started: boolean) => void;
}

/** A worker that has not said that it is ready by then never will: its script was blocked or not found. */
const startSeconds = 20;

/** The pane's data and the latest that worksheet functions asked about. */
const mostSources = 2;

export function takeSeat(hire: () => WorkerLine, ears: Ears): Seat {
  const line = hire();
  let started = false;
  const lose = (text: string): void => {
    leave();
    ears.lost(new Error(text), started);
  };
  const timer = setTimeout(() => lose("The worker did not start."), startSeconds * 1000);
  const leave = (): void => {
    clearTimeout(timer);
    line.onmessage = line.onmessageerror = line.onerror = null;
    line.terminate();
  };
  line.onmessage = ({ data }) => {
    started = true;
    clearTimeout(timer);
    if (data.kind !== "ready") ears.message(data);
  };
  line.onmessageerror = () => lose("A message of the worker could not be read.");
  line.onerror = ({ message }) => lose(`The worker stopped: ${message ?? "no reason given"}`);
  const numberOf = keeper(line);
  const ask: Seat["ask"] = (job, task, whole) => {
    if ("source" in whole) {
      const { source, ...asked } = whole;
      line.postMessage({ kind: "compute", job, task, source: numberOf(source), asked });
    } else line.postMessage({ kind: "compute", job, task, source: null, asked: whole });
  };
  return { ask, leave };
}

/** Sends a source when it is first needed, and lets the worker forget the one that was not used for longest. */
function keeper(line: WorkerLine): (source: Source) => number {
  const held = new Map<Source, number>();
  let count = 0;
  return (source) => {
    const number = held.get(source) ?? count++;
    if (!held.delete(source)) line.postMessage({ kind: "keep", source: number, data: source });
    held.set(source, number);
    const [oldest] = held;
    if (held.size > mostSources && oldest !== undefined) {
      held.delete(oldest[0]);
      line.postMessage({ kind: "forget", source: oldest[1] });
    }
    return number;
  };
}
