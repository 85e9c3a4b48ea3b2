import type { Errand } from "../app/errand.ts";
import { failure } from "../core/problem/result.ts";
import type { FromWorker, WorkerLine } from "./protocol.ts";
import { type Seat, takeSeat } from "./seat.ts";
import type { Asked, Computed, TaskName } from "./tasks.ts";

export interface Job {
  readonly id: number;
  readonly task: TaskName;
  readonly asked: Asked<TaskName>;
  readonly errand: Errand;
  readonly resolve: (result: Computed<TaskName>) => void;
  readonly reject: (fault: Error) => void;
  /** Does the job where no worker can start. */
  readonly withoutWorker: () => void;
}

/** Jobs in the order they came, the one under way, and the worker in its place. */
interface LineUp {
  readonly hire: () => WorkerLine;
  readonly waiting: Job[];
  running: Job | null;
  seat: Seat | null;
  startable: boolean;
}

export const lineUp = (hire: () => WorkerLine): LineUp => ({
  hire,
  waiting: [],
  running: null,
  seat: null,
  startable: true,
});

export function add(line: LineUp, job: Job): void {
  line.waiting.push(job);
  next(line);
}

/** Takes a job off the line, wherever it stands; a worker in the middle of it is let go. */
export function remove(line: LineUp, job: Job): void {
  const place = line.waiting.indexOf(job);
  if (place >= 0) line.waiting.splice(place, 1);
  job.resolve(failure({ code: "cancelled" }));
  if (job !== line.running) return;
  line.seat?.leave();
  line.seat = null;
  settle(line, () => undefined);
}

function next(line: LineUp): void {
  if (line.running !== null) return;
  const job = line.waiting.shift();
  if (job === undefined) return;
  line.running = job;
  line.seat ??= seatOrNull(line);
  if (line.seat === null) lose(line, new Error("No worker can be started."), false);
  else line.seat.ask(job.id, job.task, job.asked);
}

/** Browsers throw where a page may not start workers at all. */
function seatOrNull(line: LineUp): Seat | null {
  if (!line.startable) return null;
  try {
    return takeSeat(line.hire, {
      message: (message) => hear(line, message),
      lost: (fault, started) => lose(line, fault, started),
    });
  } catch {
    return null;
  }
}

function hear(line: LineUp, message: FromWorker): void {
  if (message.kind === "ready" || message.job !== line.running?.id) return;
  if (message.kind === "progress") line.running.errand.progress({ what: message.what, share: message.share });
  else if (message.kind === "done") settle(line, (job) => job.resolve(message.result));
  else settle(line, (job) => job.reject(faultOf(message)));
}

/** A worker that had started and stopped has a fault of ours to tell; one that never started is done without. */
function lose(line: LineUp, fault: Error, started: boolean): void {
  line.seat = null;
  line.startable = started;
  settle(line, (job) => {
    if (started) job.reject(fault);
    else job.withoutWorker();
  });
}

function settle(line: LineUp, finish: (job: Job) => void): void {
  const job = line.running;
  line.running = null;
  if (job !== null) finish(job);
  next(line);
}

const faultOf = ({ message, stack }: Extract<FromWorker, { kind: "failed" }>): Error =>
  Object.assign(new Error(message), { stack });
