type Known<T> = { readonly [K in keyof T]?: Exclude<T[K], undefined> };

/** The entries that have a value: what is not known is left out, not set to undefined. */
export function known<T extends object>(entries: T): Known<T> {
  return Object.fromEntries(Object.entries(entries).filter(([, value]) => value !== undefined)) as Known<T>;
}
