import { ICommandService, type ICommandInfo, type IExecutionOptions } from "@univerjs/core";
import {
  FormulaExecutedStateType,
  FormulaExecuteStageType,
  IActiveDirtyManagerService,
  IFormulaRuntimeService,
  SetFormulaCalculationNotificationMutation,
  SetFormulaCalculationStartMutation,
  SetFormulaCalculationStopMutation,
  SetTriggerFormulaCalculationStartMutation,
} from "@univerjs/engine-formula";
import { toRange, type Area } from "./areas.ts";
import type { Book } from "./book.ts";
import { carryOut, command, styleTrigger } from "./grid.ts";

/** Marks cells as changed: formulas in them, and those that depend on them, are calculated. */
export function recalculate(book: Book, areas: readonly Area[]): void {
  const dirtyRanges = areas.map((area) => ({ unitId: book.unit, sheetId: area.sheet, range: toRange(area) }));
  startCalculation(book, { dirtyRanges });
}

/** Calculates every formula of the workbook, changed or not. */
export const recalculateAll = (book: Book): void => startCalculation(book, { forceCalculation: true });

function startCalculation(book: Book, what: object): void {
  const nothing = {
    dirtyRanges: [],
    dirtyNameMap: {},
    dirtyDefinedNameMap: {},
    dirtyUnitFeatureMap: {},
    dirtyUnitOtherFormulaMap: {},
    clearDependencyTreeCache: {},
    forceCalculation: false,
  };
  carryOut(book.grid, SetTriggerFormulaCalculationStartMutation.id, { ...nothing, ...what });
}

/** What goes on in the formula engine, told apart so that one can wait for it to be quiet. */
export interface Calculation {
  readonly busy: () => boolean;
  /** Called at the end of every calculation that ran to its end. */
  readonly onFinished: (listener: () => void) => void;
  readonly stop: () => void;
}

/** What a run of the engine was told to take for changed. */
interface Dirt {
  readonly forceCalculation?: boolean;
  readonly dirtyRanges?: readonly unknown[];
}

interface Run {
  readonly dirt: Dirt;
  /** Begun while another was at work, which changes beneath it what it is to calculate. */
  readonly crossed: boolean;
  stopped: boolean;
}

/**
 * The engine begins a run while another is under way, and forgets what a stopped run was to calculate. So every run's
 * task is written down here until a run that was neither stopped nor crossed has done it.
 */
interface Ledger {
  readonly book: Book;
  readonly listeners: (() => void)[];
  /** Runs that have begun and not ended; they end in the order in which they begin. */
  readonly runs: Run[];
  /** The last stage of the first run was reached; its results follow. */
  ending: boolean;
  /** Changes that the engine has seen and not yet begun to calculate. */
  waiting: ICommandInfo[];
  /** Changes for which it asked the run under way to stop and begin anew. */
  interrupting: ICommandInfo[];
  /** Tasks of runs that did not do them. */
  owed: Dirt[];
}

export function watchCalculation(book: Book): Calculation {
  // A run that stops leaves a message channel open behind it, and an open channel keeps Node from ending. What a run
  // should have stopped for is calculated after it instead.
  book.grid.injector.get(IFormulaRuntimeService).isStopExecution = () => false;
  const ledger: Ledger = { book, listeners: [], runs: [], ending: false, waiting: [], interrupting: [], owed: [] };
  const follow = book.grid.injector
    .get(ICommandService)
    .onCommandExecuted((info, options) => follows(ledger, info, options));
  return {
    busy: () => ledger.runs.length + ledger.waiting.length + ledger.owed.length > 0,
    onFinished: (listener) => ledger.listeners.push(listener),
    stop: () => follow.dispose(),
  };
}

function follows(ledger: Ledger, info: Readonly<ICommandInfo>, options?: IExecutionOptions): void {
  switch (info.id) {
    case SetFormulaCalculationStartMutation.id:
      ledger.runs.push({
        dirt: info.params ?? {},
        crossed: ledger.runs.some(({ stopped }) => !stopped),
        stopped: false,
      });
      ledger.waiting = [];
      break;
    case SetFormulaCalculationStopMutation.id:
      ledger.interrupting.push(...ledger.waiting);
      ledger.waiting = [];
      break;
    case SetFormulaCalculationNotificationMutation.id:
      heed(ledger, info.params ?? {});
      break;
    default: {
      const dirt = ledger.book.grid.injector.get(IActiveDirtyManagerService);
      if (dirt.get(info.id) !== undefined && setsOff(info, options)) ledger.waiting.push(info);
    }
  }
}

interface Notice {
  readonly stageInfo?: { readonly stage: FormulaExecuteStageType };
  readonly functionsExecutedState?: FormulaExecutedStateType;
}

/** A run tells its last stage once, and then what it ended in; that it was stopped it tells before, too. */
function heed(ledger: Ledger, { stageInfo, functionsExecutedState: state }: Notice): void {
  if (stageInfo?.stage === FormulaExecuteStageType.CALCULATION_COMPLETED) ledger.ending = true;
  if (state === undefined) return;
  if (ledger.ending) endRun(ledger, state);
  else if (state === FormulaExecutedStateType.STOP_EXECUTION) {
    const [run] = ledger.runs;
    if (run !== undefined) run.stopped = true;
    // The engine begins anew at once, with these.
    ledger.interrupting = [];
  }
}

function endRun(ledger: Ledger, state: FormulaExecutedStateType): void {
  const run = ledger.runs.shift();
  ledger.ending = false;
  const whole = state === FormulaExecutedStateType.SUCCESS || state === FormulaExecutedStateType.NOT_EXECUTED;
  if (run !== undefined) {
    if (whole && !run.stopped && !run.crossed) ledger.owed = ledger.owed.filter((dirt) => !covers(run.dirt, dirt));
    else ledger.owed.push(run.dirt);
  }
  if (whole) {
    repeatInterruption(ledger);
    for (const listener of ledger.listeners) listener();
  }
  if (ledger.runs.length === 0 && ledger.waiting.length === 0) {
    for (const dirt of ledger.owed.splice(0)) startCalculation(ledger.book, dirt);
  }
}

/** Whether a run over the one takes in all that the other speaks of. */
function covers(one: Dirt, other: Dirt): boolean {
  if (one.forceCalculation === true) return true;
  const ranges = new Set((one.dirtyRanges ?? []).map((range) => JSON.stringify(range)));
  const rest = (dirt: Dirt): string =>
    JSON.stringify({ ...dirt, dirtyRanges: null, rowData: null, maxIteration: null });
  const same = rest(one) === rest(other);
  return same && (other.dirtyRanges ?? []).every((range) => ranges.has(JSON.stringify(range)));
}

/** Asked to stop when it was as good as done, the engine ends well and forgets that it was to begin anew. */
function repeatInterruption(ledger: Ledger): void {
  const dirt = ledger.book.grid.injector.get(IActiveDirtyManagerService);
  for (const info of ledger.interrupting.splice(0)) {
    startCalculation(ledger.book, dirt.get(info.id)?.getDirtyData(info) ?? {});
  }
}

/** The engine itself leaves its own results and mere formatting out of account. */
function setsOff({ id, params }: Readonly<ICommandInfo>, options?: IExecutionOptions): boolean {
  if (id !== command.setValues) return true;
  return options?.onlyLocal !== true && (params as { readonly trigger?: string }).trigger !== styleTrigger;
}
