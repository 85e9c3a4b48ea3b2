import type { BookData } from "../book/bookData.ts";
import { startEvents } from "../excel/events.ts";
import { calm, type Host, type Switches } from "../excel/host.ts";
import { raiseChanges } from "../excel/raise.ts";
import { registerFunctions, type AddInFunctions } from "../workbook/addInFunctions.ts";
import { recalculate, watchCalculation, type Calculation } from "../workbook/calculation.ts";
import { watchChanges } from "../workbook/changes.ts";
import type { Book } from "../workbook/book.ts";
import type { Grid } from "../workbook/grid.ts";
import type { BlankArrival, FunctionsMetadata } from "../workbook/metadata.ts";
import { calculateUnsaved, openBook } from "../workbook/openBook.ts";
import { startCalls, type Call, type CallDoors } from "../workbook/pendingCalls.ts";
import { followChanges } from "../workbook/shifts.ts";
import { snapshotOf } from "../workbook/snapshot.ts";
import { tellLetNamesApart } from "../workbook/letNames.ts";
import { spellTables } from "../workbook/spellTables.ts";
import { forgetRuns } from "../workbook/forgetRuns.ts";
import { growTo } from "../workbook/write.ts";
import { callTexts, cancelText, eventText, outcomeOf } from "./callTexts.ts";
import { hands, type Hands } from "./hands.ts";
import { serveRequests, type Server } from "./serve.ts";
import type { Transport } from "./transport.ts";

export interface DeskOptions {
  readonly book: BookData;
  /** functions.json of the add-in; without it every function of the add-in answers #NAME?. */
  readonly functions?: FunctionsMetadata;
  readonly namespace?: string;
  readonly profile?: Switches["profile"];
  /** What a blank cell becomes in an argument of type any. */
  readonly blank?: BlankArrival;
}

/** The stand-in spreadsheet at work: one workbook, one add-in. */
export interface Desk extends Hands {
  readonly book: Book;
  readonly host: Host;
  readonly switches: Switches;
  /** How a blank cell arrives at a function. */
  readonly arrival: { blank: BlankArrival };
  /** Resolves when no formula is being calculated and no function of the add-in is at work. */
  readonly settle: () => Promise<void>;
  readonly snapshot: () => BookData;
  readonly stop: () => void;
}

const standardNamespace = "FOOTING";

/** Opens a workbook in a grid and answers the add-in at the other end of the line. */
export function startDesk(grid: Grid, line: Transport, options: DeskOptions): Desk {
  const server = serveRequests(line);
  const book = openBook(grid, options.book);
  const calculation = watchCalculation(book);
  const functions = functionsOf({ line, server, options }, (results) => takeIn(book, results));
  registerFunctions(book, functions);
  spellTables(book);
  tellLetNamesApart(book);
  forgetRuns(grid);
  calculation.onFinished(functions.calls.settle);
  const host = hostOf(book, { calculation, functions, server, profile: options.profile ?? "desktop" });
  book.listeners.add((change) => followChanges(book, change));
  book.listeners.add((change) => raiseChanges(host, change));
  const stopWatching = watchChanges(book);
  calculateUnsaved(book, options.book);
  server.answer(host);
  return {
    ...hands(host, functions.messages),
    book,
    host,
    switches: host.switches,
    arrival: functions.arrival,
    settle: () => until(() => !calculation.busy() && functions.calls.unanswered().length === 0 && !server.busy()),
    snapshot: () => snapshotOf(book),
    stop: () => {
      stopWatching();
      calculation.stop();
    },
  };
}

/** Results have come: their cells are calculated again, on a sheet that is large enough for what they fill. */
function takeIn(book: Book, results: Arrived): void {
  for (const { fills } of results) growTo(book, fills);
  const cells = results.map(({ cell }) => cell);
  recalculate(book, cells);
}

type Arrived = Parameters<CallDoors["arrived"]>[0];

interface Ends {
  readonly line: Transport;
  readonly server: Server;
  readonly options: DeskOptions;
}

/** Calls wait until the add-in has started, as in Excel; one that starts anew is asked again what it never answered. */
function functionsOf({ line, server, options }: Ends, arrived: CallDoors["arrived"]): AddInFunctions {
  const { functions = { functions: [] }, namespace = standardNamespace, blank = null } = options;
  let isReady = false;
  const ask = (asked: readonly Call[]): void => {
    if (isReady) callTexts(asked).forEach(line.send);
  };
  const calls = startCalls({ make: ask, cancel: (ids) => line.send(cancelText(ids)), arrived });
  server.onReady(() => {
    isReady = true;
    ask(calls.unanswered());
  });
  return { namespace, metadata: functions, calls, arrival: { blank }, messages: new Map() };
}

interface Parts {
  readonly calculation: Calculation;
  readonly functions: AddInFunctions;
  readonly server: Server;
  readonly profile: Switches["profile"];
}

function hostOf(book: Book, { calculation, functions, server, profile }: Parts): Host {
  return {
    book,
    switches: calm(profile),
    events: startEvents((event) => server.after(eventText(event))),
    references: { kept: new Map(), names: new WeakMap(), given: 0 },
    isCalculating: calculation.busy,
    calculated: () => until(() => !calculation.busy()),
    takeResults: (results) => functions.calls.answer(results.map((result) => [result[0], outcomeOf(result)] as const)),
  };
}

const pollMilliseconds = 5;
/** Longer than any calculation of ours takes; a function that never answers must not hang a test or the terminal. */
const patienceMilliseconds = 300_000;

/** Looks twice, since the end of one thing may set off another a moment later. */
async function until(quiet: () => boolean): Promise<void> {
  const start = performance.now();
  for (let seen = 0; seen < 2; seen = quiet() ? seen + 1 : 0) {
    if (performance.now() - start > patienceMilliseconds) throw new Error("The desk does not come to rest.");
    await new Promise((resolve) => setTimeout(resolve, pollMilliseconds));
  }
}
