import { afterAll, afterEach, beforeAll, beforeEach, expect } from "vitest";
import { type DeskPage, type DeskSuite, startDeskSuite } from "./deskPage.ts";

/**
 * Gives every test of a file a desk of its own, which may ask no other host for anything nor throw a fault.
 * @returns the desk of the test that runs.
 */
export function deskForEachTest(): Pick<DeskPage, "page" | "pane"> {
  let suite: DeskSuite;
  let desk: DeskPage;
  beforeAll(async () => {
    suite = await startDeskSuite();
  });
  afterAll(() => suite.close());
  beforeEach(async () => {
    desk = await suite.openDesk();
  });
  afterEach(async () => {
    expect(desk.asked, "no other host is asked for anything").toEqual([]);
    expect(desk.faults).toEqual([]);
    await desk.close();
  });
  return {
    get page() {
      return desk.page;
    },
    get pane() {
      return desk.pane;
    },
  };
}
