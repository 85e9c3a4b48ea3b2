import type { Source } from "../core/table/source.ts";
import type { Computed, TaskName } from "./tasks.ts";

/**
 * Plain messages between the client and its worker. Sources go over once, under a number, and stay there for the next
 * question about the same cells; the sender keeps its own copy, so that work can be given to a new worker.
 */
export type ToWorker =
  | { readonly kind: "keep"; readonly source: number; readonly data: Source }
  | { readonly kind: "forget"; readonly source: number }
  | {
      readonly kind: "compute";
      readonly job: number;
      readonly task: TaskName;
      /** Null where the task asks about no source. */
      readonly source: number | null;
      /** All but the source itself. */
      readonly asked: object;
    };

export type FromWorker =
  | { readonly kind: "ready" }
  | { readonly kind: "progress"; readonly job: number; readonly what: string; readonly share: number }
  | { readonly kind: "done"; readonly job: number; readonly result: Computed<TaskName> }
  /** A fault of ours: what was thrown, for the details that can be copied. */
  | { readonly kind: "failed"; readonly job: number; readonly message: string; readonly stack: string };

/** The worker's end of the line. */
export interface WorkerPort {
  readonly postMessage: (message: FromWorker) => void;
  onmessage: ((event: { readonly data: ToWorker }) => void) | null;
}

/** The client's end: the part of a Worker that is used. */
export interface WorkerLine {
  readonly postMessage: (message: ToWorker) => void;
  readonly terminate: () => void;
  onmessage: ((event: { readonly data: FromWorker }) => void) | null;
  onmessageerror: ((event: unknown) => void) | null;
  onerror: ((event: { readonly message?: string }) => void) | null;
}
