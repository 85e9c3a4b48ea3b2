import { rmSync, mkdtempSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { Worker } from "node:worker_threads";
import { build } from "esbuild";
import type { FromWorker, ToWorker, WorkerLine } from "../../src/worker/protocol.ts";

/** A real thread behind the face of a browser's worker, counted, with what was sent to it. */
export interface Threads {
  readonly hire: () => WorkerLine;
  readonly sent: ToWorker["kind"][];
  readonly hired: () => number;
  /** Threads that have come to their end. */
  readonly ended: () => number;
  readonly close: () => Promise<void>;
}

export async function threadsOf(entry: string): Promise<Threads> {
  const folder = mkdtempSync(join(tmpdir(), "footing-thread-"));
  const file = join(folder, "thread.mjs");
  await build({ entryPoints: [entry], bundle: true, platform: "node", format: "esm", outfile: file });
  const workers: Worker[] = [];
  const sent: ToWorker["kind"][] = [];
  let ended = 0;
  const hire = (): WorkerLine => {
    const worker = new Worker(file);
    workers.push(worker);
    worker.on("exit", () => ended++);
    return lineTo(worker, sent);
  };
  const close = async (): Promise<void> => {
    await Promise.all(workers.map((worker) => worker.terminate()));
    rmSync(folder, { recursive: true });
  };
  return { hire, sent, hired: () => workers.length, ended: () => ended, close };
}

function lineTo(worker: Worker, sent: ToWorker["kind"][]): WorkerLine {
  const line: WorkerLine = {
    postMessage: (message) => {
      sent.push(message.kind);
      worker.postMessage(message);
    },
    terminate: () => void worker.terminate(),
    onmessage: null,
    onmessageerror: null,
    onerror: null,
  };
  worker.on("message", (data: FromWorker) => line.onmessage?.({ data }));
  worker.on("error", (fault: Error) => line.onerror?.({ message: fault.message }));
  worker.on("exit", (code) => line.onerror?.({ message: `exit ${code}` }));
  return line;
}
