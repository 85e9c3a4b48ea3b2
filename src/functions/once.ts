import type { Result } from "../core/problem/result.ts";
import { type CalledData, readData } from "./readData.ts";

/** Does a piece of work once for an object, for as long as somebody else still holds the object. */
export function onceFor<Given extends object, Done>(work: (given: Given) => Done): (given: Given) => Done {
  const done = new WeakMap<Given, Done>();
  return (given) => {
    const before = done.get(given);
    if (before !== undefined) return before;
    const now = work(given);
    done.set(given, now);
    return now;
  };
}

type Values = Parameters<typeof readData>[0];

/**
 * Reads arguments as `readData` does, and the very same arrays once: a host may hand one range to many calls. Arguments
 * are never written to, by anyone.
 */
export function readOnce(): (values: Values) => Result<CalledData> {
  const readings = onceFor<object, Reading[]>(() => []);
  return (values) => {
    const { outcome } = values;
    if (typeof outcome !== "object" || outcome === null) return readData(values);
    const before = readings(outcome).find((reading) => isSame(reading.values, values));
    if (before !== undefined) return before.result;
    const result = readData(values);
    readings(outcome).push({ values: { drivers: values["drivers"], key: values["key"] }, result });
    return result;
  };
}

interface Reading {
  readonly values: Values;
  readonly result: Result<CalledData>;
}

const isSame = (one: Values, other: Values): boolean =>
  one["drivers"] === other["drivers"] && one["key"] === other["key"];
