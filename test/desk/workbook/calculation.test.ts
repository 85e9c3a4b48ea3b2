import { ICommandService, type ICommandInfo } from "@univerjs/core";
import {
  FormulaExecuteStageType as Stage,
  FormulaExecutedStateType as State,
  SetFormulaCalculationNotificationMutation as Notice,
  SetFormulaCalculationStartMutation as Start,
  SetFormulaCalculationStopMutation as Stop,
  SetTriggerFormulaCalculationStartMutation as Trigger,
} from "@univerjs/engine-formula";
import { beforeEach, expect, it } from "vitest";
import type { Book } from "../../../src/desk/workbook/book.ts";
import { watchCalculation, type Calculation } from "../../../src/desk/workbook/calculation.ts";

const edit = "sheet.mutation.set-range-values";

/** Plays the formula engine: what it says, in the orders seen when it is pressed. */
let say: (id: string, params?: object) => void;
let calculation: Calculation;
let asked: unknown[];

beforeEach(() => {
  asked = [];
  const commands = {
    onCommandExecuted: (listener: (info: ICommandInfo) => void) => {
      say = (id, params = {}) => listener({ id, params });
      return { dispose: () => undefined };
    },
    syncExecuteCommand: (id: string, params: { readonly dirtyRanges: unknown }) => {
      asked.push(params.dirtyRanges);
      say(id, params);
      return true;
    },
  };
  const dirt = {
    get: (id: string) =>
      id === edit || id === Trigger.id
        ? { getDirtyData: ({ params }: ICommandInfo) => ({ dirtyRanges: [(params as { at: number }).at] }) }
        : undefined,
  };
  const injector = { get: (token: unknown) => (token === ICommandService ? commands : dirt) };
  calculation = watchCalculation({ grid: { injector } } as unknown as Book);
});

const begin = (...cells: readonly number[]): void => {
  say(Start.id, { dirtyRanges: cells });
  say(Notice.id, { stageInfo: { stage: Stage.START } });
};
const end = (state: State): void => {
  say(Notice.id, { stageInfo: { stage: Stage.CALCULATION_COMPLETED } });
  say(Notice.id, { functionsExecutedState: state });
};

it("is busy from a change until the run that takes it in has ended", () => {
  expect(calculation.busy()).toBe(false);
  say(edit, { at: 1 });
  expect(calculation.busy()).toBe(true);
  begin(1);
  expect(calculation.busy()).toBe(true);
  end(State.SUCCESS);
  expect(calculation.busy()).toBe(false);
  expect(asked).toEqual([]);
});

it("repeats a change for which the engine asked itself to stop too late", () => {
  say(edit, { at: 1 });
  begin(1);
  say(edit, { at: 2 });
  say(Stop.id);
  end(State.SUCCESS);
  expect(asked).toEqual([[2]]);
  expect(calculation.busy()).toBe(true);
});

it("repeats what a stopped run was to do, unless the next run takes it in", () => {
  say(edit, { at: 1 });
  begin(1);
  say(edit, { at: 2 });
  say(Stop.id);
  say(Notice.id, { functionsExecutedState: State.STOP_EXECUTION });
  begin(1, 2);
  end(State.STOP_EXECUTION);
  end(State.SUCCESS);
  expect(asked).toEqual([]);
  say(edit, { at: 3 });
  begin(3);
  say(edit, { at: 4 });
  say(Stop.id);
  say(Notice.id, { functionsExecutedState: State.STOP_EXECUTION });
  begin(4);
  end(State.STOP_EXECUTION);
  end(State.SUCCESS);
  expect(asked).toEqual([[3]]);
});

it("repeats a run that began while another was at work", () => {
  say(edit, { at: 1 });
  begin(1);
  begin(1, 2);
  end(State.SUCCESS);
  end(State.SUCCESS);
  expect(asked).toEqual([[1, 2]]);
  begin(1, 2);
  end(State.SUCCESS);
  expect(calculation.busy()).toBe(false);
});
