import { type Pane, createPane } from "../../src/app/pane.ts";
import type { PaneState } from "../../src/app/state.ts";
import { messageOf } from "../../src/core/problem/messages.ts";
import type { BookData } from "../../src/desk/book/bookData.ts";
import { demoBook } from "../../src/desk/demo/demoBook.ts";
import { openXlsx } from "../../src/desk/files/openXlsx.ts";
import { saveXlsx } from "../../src/desk/files/saveXlsx.ts";
import { registerFunctions } from "../../src/functions/register.ts";
import { inlineAnalyst } from "../../src/worker/inlineAnalyst.ts";
import { inlineReviewer } from "../../src/worker/inlineReviewer.ts";
import { type DeskHost, openDeskHost } from "./deskHost.ts";

/** The pane without its looks, over the stand-in spreadsheet and the real analysis. */
export interface DeskPane extends DeskHost {
  readonly pane: Pane;
  readonly state: () => PaneState;
  /** Carries out a command to its end; a fault that the pane shows is thrown, unless it is asked for. */
  readonly carryOut: (command: () => void) => Promise<void>;
  /** The sentence of the fault that a command ends in. */
  readonly faultOf: (command: () => void) => Promise<string>;
  /** The workbook as its file holds it. */
  readonly saved: () => Promise<BookData>;
  readonly close: () => void;
}

export async function openDeskPane(book: BookData): Promise<DeskPane> {
  const at = await openDeskHost(book);
  registerFunctions(at.desk.CustomFunctions, inlineAnalyst);
  const work: Promise<void>[] = [];
  const pane = createPane({
    host: at.host,
    analyst: { ...inlineAnalyst, ...inlineReviewer },
    edition: { today: () => "1 December 2026", version: "0.1.0" },
    guard: (task) => void work.push(task()),
  });
  const state = (): PaneState => pane.store.get();
  const toEnd = async (command: () => void): Promise<void> => {
    command();
    while (work.length > 0) await work.shift();
    await at.desk.settle();
  };
  const faultSaid = (): string => {
    const { fault } = state();
    return fault === null ? "" : fault.kind === "problem" ? messageOf(fault.problem) : fault.details;
  };
  return {
    ...at,
    pane,
    state,
    carryOut: async (command) => {
      await toEnd(command);
      if (faultSaid() !== "") throw new Error(faultSaid());
    },
    faultOf: async (command) => {
      await toEnd(command);
      return faultSaid();
    },
    saved: async () => {
      const reading = await openXlsx(await saveXlsx(at.desk.snapshot()));
      if (!reading.ok) throw new Error(reading.because);
      return reading.value;
    },
    close: () => at.desk.close(),
  };
}

/** The demo workbook with the months read and answered. */
export async function openAnsweredMonths(): Promise<DeskPane> {
  const at = await openDeskPane(demoBook());
  await at.carryOut(() => at.pane.commands.read({ kind: "address", address: "Months!A4:E100" }));
  await at.carryOut(at.pane.commands.answer);
  return at;
}
