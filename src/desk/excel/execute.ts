import { flushDrafts } from "../workbook/drafts.ts";
import { fault, isFault } from "./fault.ts";
import { families } from "./families.ts";
import type { Host } from "./host.ts";
import { hold, type Held } from "./held.ts";
import type { Family } from "./model.ts";
import { identityOf, query, type Query, type Reading } from "./query.ts";

/** A request of the client: what to do, in order, and how to find the objects it speaks of. */
export interface RequestBody {
  readonly Actions: readonly Action[];
  readonly ObjectPaths: Readonly<Record<string, ObjectPath>>;
  readonly AutoKeepReference?: boolean;
}

interface Named {
  readonly Name: string;
  readonly ArgumentInfo?: {
    readonly Arguments?: readonly unknown[] | null;
    readonly ReferencedObjectPathIds?: readonly unknown[] | null;
  };
}

interface Action extends Named {
  readonly Id: number;
  readonly ActionType: number;
  readonly ObjectPathId: number;
  readonly QueryInfo?: Query;
}

interface ObjectPath extends Named {
  readonly ObjectPathType: number;
  readonly ParentObjectPathId?: number;
}

export interface ResponseBody {
  readonly Results: readonly { readonly ActionId: number; readonly Value: unknown }[];
  readonly TraceIds: readonly number[];
  readonly Error?: {
    readonly Code: string;
    readonly Message: string;
    readonly ActionIndex: number;
    readonly Location: string;
  };
}

const action = { instantiate: 1, query: 2, method: 3, set: 4, trace: 5 } as const;
const path = { workbook: 1, created: 2, method: 3, property: 4, indexer: 5, reference: 6, nothing: 7 } as const;

/** Services the client makes by their full name instead of walking from the workbook. */
const services: Readonly<Record<string, Held>> = {
  "Microsoft.ExcelServices.CustomFunctions": hold("CustomFunctions", null),
};

interface Run {
  readonly host: Host;
  readonly body: RequestBody;
  /** Each path is walked once a request: a method that makes something must not make it twice. */
  readonly found: Map<number, Held | null>;
  /** Paths of objects that the client tracks from now on. */
  readonly keeps: ReadonlySet<number>;
}

const keepReference = "_KeepReference";

/** Carries out a request in order and stops at the first fault; what was done before it stays done. */
export async function execute(host: Host, body: RequestBody): Promise<ResponseBody> {
  const keeps = body.Actions.filter(({ Name }) => Name === keepReference).map(({ ObjectPathId }) => ObjectPathId);
  const run: Run = { host, body, found: new Map(), keeps: new Set(keeps) };
  const Results: { ActionId: number; Value: unknown }[] = [];
  const TraceIds = body.Actions.filter(({ ActionType }) => ActionType === action.trace).map(({ Id }) => Id);
  for (const [ActionIndex, one] of body.Actions.entries()) {
    try {
      // Excel calculates as it writes: what is read afterwards is up to date.
      if (dependsOnResults(run, one)) await upToDate(host);
      Results.push({ ActionId: one.Id, Value: carryOut(run, one) });
    } catch (error) {
      // A fault of the stand-in itself is told as one, with its own words: it must never look like Excel's.
      const Code = isFault(error) ? error.code : "GeneralException";
      const Message = error instanceof Error ? error.message : String(error);
      flushDrafts(host.book);
      return { Results, TraceIds: [], Error: { Code, Message, ActionIndex, Location: one.Name } };
    }
  }
  flushDrafts(host.book);
  return { Results, TraceIds };
}

/** Loads, and ranges that are found by what formulas fill. */
function dependsOnResults({ body }: Run, one: Action): boolean {
  if (one.ActionType === action.query) return true;
  const name = body.ObjectPaths[one.ObjectPathId]?.Name ?? "";
  return one.ActionType === action.instantiate && /Spill|UsedRange|SurroundingRegion/.test(name);
}

async function upToDate(host: Host): Promise<void> {
  flushDrafts(host.book);
  if (host.isCalculating()) await host.calculated();
}

function carryOut(run: Run, one: Action): unknown {
  if (one.ActionType === action.trace) return null;
  const object = find(run, one.ObjectPathId);
  switch (one.ActionType) {
    case action.instantiate:
      return object === null ? null : identityOf(readingOf(run, one), object);
    case action.query:
      return object === null ? null : query(readingOf(run, one), object, one.QueryInfo ?? {});
    case action.method:
      return invoke(run, object, one);
    case action.set:
      return assign(run, object, one);
    default:
      throw fault("ApiNotFound", `Action ${one.ActionType}.`);
  }
}

function invoke(run: Run, object: Held | null, one: Action): unknown {
  if (one.Name === keepReference) return null;
  if (object === null) throw fault("ItemNotFound");
  const method = familyOf(object).call?.[one.Name];
  if (method !== undefined) return method(object.state, run.host, argumentsOf(run, one)) ?? null;
  throw fault("ApiNotFound", `${object.type}.${one.Name}`);
}

function assign(run: Run, object: Held | null, one: Action): null {
  if (object === null) throw fault("ItemNotFound");
  const setter = familyOf(object).write?.[one.Name];
  if (setter === undefined) throw fault("ApiNotFound", `${object.type}.${one.Name}`);
  setter(object.state, run.host, argumentsOf(run, one)[0]);
  return null;
}

/** The table speaks of one type's state; which type it is was settled when the object was found. */
export const familyOf = (object: Held): Family<unknown> => families[object.type] as Family<unknown>;

function find(run: Run, id: number): Held | null {
  const known = run.found.get(id);
  if (known !== undefined) return known;
  const at = run.body.ObjectPaths[id];
  if (at === undefined) throw fault("InvalidObjectPath");
  const object = walk(run, at);
  run.found.set(id, object);
  return object;
}

function walk(run: Run, at: ObjectPath): Held | null {
  switch (at.ObjectPathType) {
    case path.workbook:
      return hold("Workbook", null);
    case path.created:
      return services[at.Name] ?? notAnswered(at.Name);
    case path.reference:
      return run.host.references.kept.get(at.Name) ?? invalidPath();
    case path.nothing:
      return null;
    default:
      return step(run, at);
  }
}

function step(run: Run, at: ObjectPath): Held | null {
  const parent = find(run, at.ParentObjectPathId ?? 0);
  if (parent === null) return null;
  const name = at.ObjectPathType === path.indexer ? "" : at.Name;
  const make = familyOf(parent).part?.[name];
  if (make === undefined) return notAnswered(`${parent.type}.${name === "" ? "getItem" : name}`);
  return make(parent.state, run.host, argumentsOf(run, at));
}

function notAnswered(name: string): never {
  throw fault("ApiNotFound", name);
}

function invalidPath(): never {
  throw fault("InvalidObjectPath");
}

/** Objects among the arguments come as the number of their path. */
function argumentsOf(run: Run, { ArgumentInfo }: Named): readonly unknown[] {
  const given = ArgumentInfo?.Arguments ?? [];
  const paths = ArgumentInfo?.ReferencedObjectPathIds ?? [];
  return given.map((value, index) => {
    const id = paths[index];
    return typeof id === "number" && id > 0 ? find(run, id) : value;
  });
}

/** A tracked range is found again by its reference, wherever the selection has gone since. */
function readingOf({ host, keeps }: Run, { ObjectPathId }: Action): Reading {
  const { kept, names } = host.references;
  return {
    host,
    referenceOf: (object) => {
      const known = names.get(object);
      if (known !== undefined) return known;
      if (!keeps.has(ObjectPathId)) return null;
      const reference = `reference-${++host.references.given}`;
      kept.set(reference, object);
      names.set(object, reference);
      return reference;
    },
  };
}
