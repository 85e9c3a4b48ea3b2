import { ICommandService, type ICommandInfo, type IExecutionOptions } from "@univerjs/core";
import {
  FormulaExecutedStateType,
  FormulaExecuteStageType,
  IActiveDirtyManagerService,
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

interface Progress {
  readonly book: Book;
  readonly listeners: (() => void)[];
  /** Runs of the engine that have begun and not ended. */
  running: number;
  /** The last stage of a run was reached; its results follow. */
  ending: boolean;
  /** Changes that the engine has seen and not yet begun to calculate. */
  waiting: ICommandInfo[];
  /** Changes for which it asked the run under way to stop and begin anew. */
  interrupting: ICommandInfo[];
}

export function watchCalculation(book: Book): Calculation {
  const progress: Progress = { book, listeners: [], running: 0, ending: false, waiting: [], interrupting: [] };
  const follow = book.grid.injector
    .get(ICommandService)
    .onCommandExecuted((info, options) => follows(progress, info, options));
  return {
    busy: () => progress.running > 0 || progress.waiting.length > 0,
    onFinished: (listener) => progress.listeners.push(listener),
    stop: () => follow.dispose(),
  };
}

function follows(progress: Progress, info: Readonly<ICommandInfo>, options?: IExecutionOptions): void {
  switch (info.id) {
    case SetFormulaCalculationStartMutation.id:
      progress.waiting = [];
      break;
    case SetFormulaCalculationStopMutation.id:
      progress.interrupting.push(...progress.waiting);
      progress.waiting = [];
      break;
    case SetFormulaCalculationNotificationMutation.id:
      heed(progress, info.params ?? {});
      break;
    default: {
      const dirt = progress.book.grid.injector.get(IActiveDirtyManagerService);
      if (dirt.get(info.id) !== undefined && setsOff(info, options)) progress.waiting.push(info);
    }
  }
}

interface Notice {
  readonly stageInfo?: { readonly stage: FormulaExecuteStageType };
  readonly functionsExecutedState?: FormulaExecutedStateType;
}

/** Every run tells its first and its last stage once; what it ended in may be told twice, the first time too early. */
function heed(progress: Progress, { stageInfo, functionsExecutedState: state }: Notice): void {
  if (stageInfo?.stage === FormulaExecuteStageType.START) progress.running += 1;
  if (stageInfo?.stage === FormulaExecuteStageType.CALCULATION_COMPLETED) progress.ending = true;
  if (state === undefined) return;
  if (state === FormulaExecutedStateType.STOP_EXECUTION) progress.interrupting = [];
  if (!progress.ending) return;
  progress.ending = false;
  progress.running -= 1;
  const whole = state === FormulaExecutedStateType.SUCCESS || state === FormulaExecutedStateType.NOT_EXECUTED;
  if (!whole) return;
  repeatInterruption(progress);
  for (const listener of progress.listeners) listener();
}

/** Asked to stop when it was as good as done, the engine ends well and forgets that it was to begin anew. */
function repeatInterruption(progress: Progress): void {
  const dirt = progress.book.grid.injector.get(IActiveDirtyManagerService);
  for (const info of progress.interrupting.splice(0)) {
    startCalculation(progress.book, dirt.get(info.id)?.getDirtyData(info) ?? {});
  }
}

/** The engine itself leaves its own results and mere formatting out of account. */
function setsOff({ id, params }: Readonly<ICommandInfo>, options?: IExecutionOptions): boolean {
  if (id !== command.setValues) return true;
  return options?.onlyLocal !== true && (params as { readonly trigger?: string }).trigger !== styleTrigger;
}
