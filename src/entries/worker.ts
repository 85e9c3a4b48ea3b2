import type { WorkerPort } from "../worker/protocol.ts";
import { serve } from "../worker/serve.ts";
import { tasks } from "../worker/tasks.ts";

serve(self as unknown as WorkerPort, tasks);
