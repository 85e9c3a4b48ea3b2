import type { Frame, Page } from "playwright-core";

/** Tells how long the pane's main thread was held up. */
export interface TaskWatch {
  /** The longest task since the watch began or was last asked, in milliseconds; 0 where none took 50 or more. */
  readonly longest: () => Promise<number>;
  /** Blocks the pane for 120 ms on purpose, so that a watch that sees nothing is found out; tells what was seen. */
  readonly provesItself: () => Promise<number>;
}

interface Noting {
  readonly durations: number[];
}

/** Begins to note how long each task on the pane's main thread takes. */
export async function watchTasks(page: Page): Promise<TaskWatch> {
  const frame = paneFrame(page);
  await frame.evaluate(() => {
    const durations: number[] = [];
    Object.assign(globalThis, { durations });
    new PerformanceObserver((list) => list.getEntries().forEach(({ duration }) => durations.push(duration))).observe({
      type: "longtask",
    });
  });
  const longest = (): Promise<number> =>
    frame.evaluate(() => Math.max(0, ...(globalThis as unknown as Noting).durations.splice(0)));
  return {
    longest,
    provesItself: async () => {
      await frame.evaluate(() => {
        setTimeout(() => {
          const end = performance.now() + 120;
          while (performance.now() < end);
        });
      });
      await page.waitForTimeout(600);
      return longest();
    },
  };
}

function paneFrame(page: Page): Frame {
  const frame = page.frames().find((candidate) => candidate.url().includes("taskpane"));
  if (frame === undefined) throw new Error("the pane has no frame");
  return frame;
}
