import { expect, it } from "vitest";
import { startEvents, type HostEvent } from "../../../src/desk/excel/events.ts";

const change = (target: string): HostEvent => ({ kind: 10, target, details: {} });

it("counts a registration from the end of the request that made it, and until it is taken back", () => {
  const told: string[] = [];
  const events = startEvents(({ target }) => told.push(target));
  events.register(10, "sheet-1");
  events.raise(change("sheet-1"));
  expect(told).toEqual([]);
  events.settle();
  events.raise(change("sheet-1"));
  events.raise(change("sheet-2"));
  expect(told).toEqual(["sheet-1"]);
  events.unregister(10, "sheet-1");
  events.raise(change("sheet-1"));
  expect(told).toEqual(["sheet-1"]);
});
