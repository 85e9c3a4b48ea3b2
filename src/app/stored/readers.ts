/** What stands in place of a value that is not as it should be. */
export const malformed = Symbol("malformed");

/** Takes a value of unknown make for what it should be, or finds it malformed. */
export type Reader<T> = (value: unknown) => T | typeof malformed;

export const text: Reader<string> = (value) => (typeof value === "string" ? value : malformed);
export const number: Reader<number> = (value) => (Number.isFinite(value) ? (value as number) : malformed);
export const flag: Reader<boolean> = (value) => (typeof value === "boolean" ? value : malformed);

export const oneOf =
  <T extends string>(...allowed: readonly T[]): Reader<T> =>
  (value) =>
    allowed.find((one) => one === value) ?? malformed;

export const orNull =
  <T>(read: Reader<T>): Reader<T | null> =>
  (value) =>
    value === null ? null : read(value);

export const listOf =
  <T>(read: Reader<T>): Reader<readonly T[]> =>
  (value) => {
    if (!Array.isArray(value)) return malformed;
    const items: T[] = [];
    for (const item of value) {
      const one = read(item);
      if (one === malformed) return malformed;
      items.push(one);
    }
    return items;
  };

/** An object with these members; others are left away. */
export const objectOf =
  <T extends object>(members: { readonly [K in keyof T]-?: Reader<T[K]> }): Reader<T> =>
  (value) => {
    if (typeof value !== "object" || value === null) return malformed;
    const found: Partial<T> = {};
    for (const key of Object.keys(members) as (keyof T & string)[]) {
      const member = members[key]((value as Partial<Record<string, unknown>>)[key]);
      if (member === malformed) return malformed;
      found[key] = member;
    }
    return found as T;
  };

/** The first reader that understands the value. */
export const eitherOf =
  <T>(...readers: readonly Reader<T>[]): Reader<T> =>
  (value) => {
    for (const read of readers) {
      const found = read(value);
      if (found !== malformed) return found;
    }
    return malformed;
  };

/** What was stored before a member existed has none: it then takes what held at the time. */
export const since =
  <T>(read: Reader<T>, before: T): Reader<T> =>
  (value) =>
    value === undefined ? before : read(value);
