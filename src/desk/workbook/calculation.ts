import { ICommandService, type ICommandInfo, type IExecutionOptions } from "@univerjs/core";
import {
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
  /** Changes that the engine has seen and not yet begun to calculate. */
  waiting: boolean;
  running: boolean;
}

/** The engine's word for a calculation that was interrupted to start anew. */
const interrupted = 1;

export function watchCalculation(book: Book): Calculation {
  const progress: Progress = { waiting: false, running: false };
  const listeners: (() => void)[] = [];
  const dirt = book.grid.injector.get(IActiveDirtyManagerService);
  const follow = book.grid.injector.get(ICommandService).onCommandExecuted((info, options) => {
    if (info.id === SetFormulaCalculationStartMutation.id) Object.assign(progress, { waiting: false, running: true });
    else if (info.id === SetFormulaCalculationStopMutation.id) progress.waiting = false;
    else if (info.id === SetFormulaCalculationNotificationMutation.id) {
      const state = endOf(info);
      if (state === null || state === interrupted) return;
      progress.running = false;
      for (const listener of listeners) listener();
    } else if (dirt.get(info.id) !== undefined && setsOff(info, options)) progress.waiting = true;
  });
  return {
    busy: () => progress.waiting || progress.running,
    onFinished: (listener) => listeners.push(listener),
    stop: () => follow.dispose(),
  };
}

function endOf({ params }: Readonly<ICommandInfo>): number | null {
  return (params as { readonly functionsExecutedState?: number } | undefined)?.functionsExecutedState ?? null;
}

/** The engine itself leaves its own results and mere formatting out of account. */
function setsOff({ id, params }: Readonly<ICommandInfo>, options?: IExecutionOptions): boolean {
  if (id !== command.setValues) return true;
  return options?.onlyLocal !== true && (params as { readonly trigger?: string }).trigger !== styleTrigger;
}
