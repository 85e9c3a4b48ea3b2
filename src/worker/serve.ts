import type { Source } from "../core/table/source.ts";
import type { FromWorker, ToWorker, WorkerPort } from "./protocol.ts";
import type { Tasks } from "./tasks.ts";

type Compute = Extract<ToWorker, { kind: "compute" }>;

/** Computes what is asked over the port, one question after the other, and says when it is ready. */
export function serve(port: WorkerPort, tasks: Tasks): void {
  const sources = new Map<number, Source>();
  const sourceOf = (number: number): Source => {
    const source = sources.get(number);
    if (source === undefined) throw new Error("The worker was asked about data it does not hold.");
    return source;
  };
  const compute = ({ job, task, asked, source }: Compute): FromWorker => {
    const report = (what: string, share: number): void => port.postMessage({ kind: "progress", job, what, share });
    try {
      const held = source === null ? {} : { source: sourceOf(source) };
      // The client sends with each task what that task asks for.
      return { kind: "done", job, result: tasks[task]({ ...asked, ...held } as never, report) };
    } catch (fault) {
      const { message, stack } = fault instanceof Error ? fault : new Error(String(fault));
      return { kind: "failed", job, message, stack: stack ?? "" };
    }
  };
  port.onmessage = ({ data }) => {
    switch (data.kind) {
      case "keep":
        sources.set(data.source, data.data);
        return;
      case "forget":
        sources.delete(data.source);
        return;
      case "compute":
        port.postMessage(compute(data));
    }
  };
  port.postMessage({ kind: "ready" });
}
