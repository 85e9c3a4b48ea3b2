import { ICommandService } from "@univerjs/core";
import {
  FormulaExecuteStageType as Stage,
  SetFormulaCalculationNotificationMutation as Notice,
} from "@univerjs/engine-formula";
import { expect, it } from "vitest";
import { testDesk } from "../../support/desk.ts";

/** The grid waits for a second before it tells how far a calculation has come. */
const untilItTells = 1100;

it("says nothing more once the desk is closed, whatever was under way", async () => {
  const desk = await testDesk();
  const commands = desk.book.grid.injector.get(ICommandService);
  commands.syncExecuteCommand(Notice.id, { stageInfo: { stage: Stage.START } });
  const faults: unknown[] = [];
  const note = (fault: unknown): void => void faults.push(fault);
  const listeners = process.rawListeners("uncaughtException") as ((fault: unknown) => void)[];
  process.removeAllListeners("uncaughtException");
  process.on("uncaughtException", note);
  desk.close();
  await new Promise((resolve) => setTimeout(resolve, untilItTells));
  process.removeAllListeners("uncaughtException");
  for (const listener of listeners) process.on("uncaughtException", listener);
  expect(faults).toEqual([]);
});
