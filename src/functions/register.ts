import type { Analyst, Inquirer } from "../app/analyst.ts";
import { withinLimits } from "../app/timeLimit.ts";
import { success } from "../core/problem/result.ts";
import { type Answering, answerer } from "./answerer.ts";
import { type FunctionsRuntime, cellError, notAvailable, ownFault } from "./cellErrors.ts";
import { type FunctionId, type FunctionSpec, functionTable } from "./functionTable.ts";
import { type Leaving, leave } from "./leave.ts";
import type { BlankGuard } from "./blankGuard.ts";
import type { Reply } from "./replies.ts";

/** A call that has no answer by then ends with an error: a promise that never settles shows #BUSY! for ever. */
const secondsPerCall = 120;

/** Gives Excel an implementation for every function of the table. */
export function registerFunctions(
  runtime: FunctionsRuntime,
  analyst: Analyst & Inquirer,
  guard: BlankGuard = asTheyArrive,
): void {
  const answering = answerer(analyst);
  for (const spec of functionTable) runtime.associate(spec.id, implementation(spec, { runtime, answering, guard }));
}

/** Without a sheet at hand. */
const asTheyArrive: BlankGuard = ({ values }) => Promise.resolve(success(values));

interface Making {
  readonly runtime: FunctionsRuntime;
  readonly answering: Answering;
  readonly guard: BlankGuard;
}

/** Excel hands over one value a parameter and, last, the invocation. */
function implementation(
  { id, parameters }: FunctionSpec & { readonly id: FunctionId },
  { runtime, answering, guard }: Making,
) {
  return async (...handed: unknown[]): Promise<Leaving> => {
    const invocation = handed.at(-1) as CustomFunctions.CancelableInvocation;
    const given = handed.slice(0, -1);
    const byName = <T>(list: readonly T[]) =>
      Object.fromEntries(parameters.map(({ name }, i) => [name, list[i] ?? null]));
    const call = { values: byName(given), addresses: byName(invocation.parameterAddresses ?? []) };
    if (isPreview(invocation)) return leave(runtime, [["Shown once the formula is entered"]]);
    const caller = new AbortController();
    invocation.onCanceled = () => caller.abort();
    const reply = await replyTo({ signal: caller.signal, seconds: secondsPerCall }, async (signal) => {
      const values = await guard(call, signal);
      return values.ok ? answering(id, values.value, signal) : values;
    })
      .catch((fault: unknown) => refuse(ownFault(runtime, fault)))
      .finally(() => {
        invocation.onCanceled = nothingToCancel;
      });
    if (reply.ok) return leave(runtime, reply.value);
    return refuse("problem" in reply ? cellError(runtime, reply.problem) : notAvailable(runtime, reply.notApplicable));
  };
}

/** The runtime keeps the invocation of every call for ever, and with it whatever this callback can reach: the call's cells. */
const nothingToCancel = (): void => undefined;

/** Ends a call with the error of its cell. */
function refuse(error: CustomFunctions.Error): never {
  // eslint-disable-next-line @typescript-eslint/only-throw-error -- the runtime's own class alone brings a sentence to the cell
  throw error;
}

/** Excel previews a formula that is being selected; its types say text, its documentation true or false. */
const isPreview = ({ isInValuePreview }: CustomFunctions.Invocation): boolean => Boolean(isInValuePreview);

async function replyTo(
  limits: Parameters<typeof withinLimits>[0],
  work: (signal: AbortSignal) => Promise<Reply>,
): Promise<Reply> {
  const within = await withinLimits(limits, async (signal) => ({ ok: true, value: await work(signal) }));
  return within.ok ? within.value : within;
}
