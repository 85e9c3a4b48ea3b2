import { fault } from "./fault.ts";
import { families } from "./families.ts";
import type { Host } from "./host.ts";
import type { Held } from "./held.ts";
import type { Family } from "./model.ts";

/** What a load asks for: paths like "address" and "format/fill/color"; nothing selected asks for all plain values. */
export interface Query {
  readonly Select?: readonly string[] | null;
  readonly Expand?: readonly string[] | null;
  readonly Top?: number;
  readonly Skip?: number;
}

export interface Reading {
  readonly host: Host;
  /** Keeps a tracked object and names it, or answers null for what is not tracked. */
  readonly referenceOf: (object: Held) => string | null;
}

/** The API's "rowCount" is "RowCount" on the wire. */
const wire = (name: string): string => name.charAt(0).toUpperCase() + name.slice(1);

const familyOf = (object: Held): Family<unknown> => families[object.type] as Family<unknown>;

export function query(reading: Reading, object: Held, asked: Query): object {
  const select = [...(asked.Select ?? []), ...(asked.Expand ?? [])];
  const { items, read = {} } = familyOf(object);
  if (items === undefined) return load(reading, object, select);
  const own = select.filter((name) => read[wire(name)] !== undefined);
  const values = Object.fromEntries(own.map((name) => [wire(name), read[wire(name)]!(object.state, reading.host)]));
  const theirs = select.filter((name) => !own.includes(name));
  if (own.length > 0 && theirs.length === 0) return values;
  const first = asked.Skip ?? 0;
  const shown = items(object.state, reading.host).slice(first, asked.Top === undefined ? undefined : first + asked.Top);
  return { ...values, _Items: shown.map((item) => load(reading, item, theirs)) };
}

/** The marks by which the client finds an object again. */
export function identityOf({ host, referenceOf }: Reading, object: Held): Record<string, unknown> {
  const id = familyOf(object).id?.(object.state, host);
  const reference = referenceOf(object);
  return { ...(id === undefined ? {} : { _Id: id }), ...(reference === null ? {} : { _ReferenceId: reference }) };
}

function load(reading: Reading, object: Held, select: readonly string[]): object {
  const out = identityOf(reading, object);
  for (const [name, inner] of branches(select.length === 0 ? ["*"] : select)) {
    if (name === "*") Object.assign(out, everyValue(reading, object));
    else out[wire(name)] = member(reading, object, { name, inner });
  }
  return out;
}

/** "format/fill/color" and "format/font/bold" are one branch, "format", with two below it. */
function branches(select: readonly string[]): ReadonlyMap<string, readonly string[]> {
  const below = new Map<string, string[]>();
  for (const path of select) {
    const [name = "", ...rest] = path.split("/");
    const inner = below.get(name) ?? [];
    if (rest.length > 0) inner.push(rest.join("/"));
    below.set(name, inner);
  }
  return below;
}

function everyValue({ host }: Reading, object: Held): object {
  const { read = {}, unasked = [] } = familyOf(object);
  const names = Object.keys(read).filter((name) => !unasked.includes(name));
  return Object.fromEntries(names.map((name) => [name, read[name]!(object.state, host)]));
}

interface Branch {
  readonly name: string;
  readonly inner: readonly string[];
}

function member(reading: Reading, object: Held, { name, inner }: Branch): unknown {
  const { read = {}, part = {}, lacks = [] } = familyOf(object);
  const known = wire(name);
  const value = read[known];
  if (value !== undefined) return value(object.state, reading.host);
  const child = part[known];
  if (child !== undefined) {
    const found = child(object.state, reading.host, []);
    return found === null ? null : query(reading, found, { Select: inner });
  }
  throw fault(lacks.includes(known) ? "ApiNotFound" : "InvalidArgument", `${object.type}.${name}`);
}
