import { registerFunctions } from "../functions/register.ts";
import { inlineAnalyst } from "../worker/inlineAnalyst.ts";
import type { WorkerLine } from "../worker/protocol.ts";
import { workerAnalyst } from "../worker/workerAnalyst.ts";

const hire = (): WorkerLine =>
  new Worker(/* webpackChunkName: "worker" */ new URL("./worker.ts", import.meta.url)) as WorkerLine;

/** Functions have a worker of their own, so that a long analysis in the pane does not hold up the cells. */
const analyst = workerAnalyst({ hire, fallback: inlineAnalyst, seconds: 600 });

// At module load: Excel looks for the functions before the page says that it is ready.
registerFunctions(CustomFunctions, analyst);
