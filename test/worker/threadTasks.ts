import { parentPort } from "node:worker_threads";
import { success } from "../../src/core/problem/result.ts";
import type { ToWorker, WorkerPort } from "../../src/worker/protocol.ts";
import { serve } from "../../src/worker/serve.ts";
import type { Tasks } from "../../src/worker/tasks.ts";
import { claimReviewFixture } from "../support/reviewFixture.ts";

/** Stand-in tasks whose conduct the outcome's heading asks for; they run in a real thread. */
const analyse = (({ source, model }, report) => {
  report("counting", 0.5);
  const conduct = model.outcome.column;
  if (conduct === "throw") throw new Error("told to throw");
  if (conduct === "crash") process.exit(3);
  for (const start = Date.now(); conduct === "slow" && Date.now() - start < 30_000;) report("still counting", 0.6);
  const sum = source.columns.flatMap(({ cells }) => [...cells.numbers]).reduce((total, number) => total + number, 0);
  return success({ title: `sum ${sum}` });
}) as Tasks["analyse"];

const thread = parentPort;
if (thread === null) throw new Error("These tasks run in a thread.");
const port: WorkerPort = { postMessage: (message) => thread.postMessage(message), onmessage: null };
thread.on("message", (data: ToWorker) => port.onmessage?.({ data }));
const inquire: Tasks["inquire"] = ({ inquiry }) =>
  success({ kind: "not-applicable", because: `asked: ${inquiry.kind}` });
const listClaims: Tasks["listClaims"] = ({ book, sheet }) =>
  success({ claims: [], unread: [{ cell: `${sheet ?? ""}!A1`, why: book.calculation }], craft: [] });
const review: Tasks["review"] = ({ claim }, report) => {
  report("trying", 0.5);
  return success({ ...claimReviewFixture, claim, verdict: "in the thread" });
};
serve(port, { analyse, inquire, listClaims, review });
