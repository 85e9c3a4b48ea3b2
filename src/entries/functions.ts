import { blankGuard } from "../functions/blankGuard.ts";
import { registerFunctions } from "../functions/register.ts";
import { excelHost } from "../office/excelHost.ts";
import { lateComputing } from "../worker/lateComputing.ts";
import type { WorkerLine } from "../worker/protocol.ts";
import { workerAnalyst } from "../worker/workerAnalyst.ts";

const hire = (): WorkerLine =>
  new Worker(/* webpackChunkName: "worker" */ new URL("./worker.ts", import.meta.url)) as WorkerLine;

/** Functions have a worker of their own, so that a long analysis in the pane does not hold up the cells. */
const analyst = workerAnalyst({ hire, fallback: lateComputing, seconds: 600 });

const { read } = excelHost();

/** Excel may call before the page's script says that it is ready. */
const readWhenReady: typeof read = async (where, errand) => {
  await Office.onReady();
  return read(where, errand);
};

/** Missing where Excel's script could not be loaded: there is nobody to call the functions then, and the pane says so. */
const runtime = (globalThis as { readonly CustomFunctions?: typeof CustomFunctions }).CustomFunctions;

// At module load: Excel looks for the functions before the page says that it is ready.
if (runtime !== undefined) registerFunctions(runtime, analyst, blankGuard(readWhenReady));
