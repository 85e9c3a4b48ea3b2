import { absoluteAddress, type Area } from "../workbook/areas.ts";
import { areaOfName, nameCalled, nameId, namesOf, removeName, setName, type BookName } from "../workbook/names.ts";
import { tableNamed } from "../workbook/tables.ts";
import { optionalText, textAt } from "./arguments.ts";
import { fault } from "./fault.ts";
import type { Host } from "./host.ts";
import { hold, type Held, type States } from "./held.ts";
import type { Arguments, Family } from "./model.ts";

type Names = States["NamedItemCollection"];

const held = ({ id }: BookName): Held => hold("NamedItem", { id });

function missing(): never {
  throw fault("ItemNotFound");
}

const on = ({ book }: Host, { sheet }: Names): readonly BookName[] =>
  namesOf(book).filter((name) => name.sheet === sheet);

function called(host: Host, state: Names, key: string): Held | null {
  const wanted = key.toLowerCase();
  const found = on(host, state).find(({ name }) => name.toLowerCase() === wanted);
  return found === undefined ? null : held(found);
}

export const names: Family<Names> = {
  items: (state, host) => on(host, state).map(held),
  part: {
    "": (state, host, args) => called(host, state, textAt(args, 0)) ?? missing(),
    GetItemOrNullObject: (state, host, args) => called(host, state, textAt(args, 0)),
    Add: (state, host, args) => add(host, state, args),
  },
  call: { GetCount: (state, host) => on(host, state).length },
};

/** Letters, digits, dots and underscores; not like an address in either notation. */
const isName = (name: string): boolean =>
  /^[\p{L}_\\][\p{L}\p{N}_.\\?]{0,254}$/u.test(name) && !/^([A-Za-z]{1,3}\d+|[rR]\d*([cC]\d*)?|[cC]\d*)$/.test(name);

function add(host: Host, { sheet }: Names, args: Arguments): Held {
  const name = textAt(args, 0);
  if (!isName(name)) throw fault("InvalidArgument", name);
  if (nameCalled(host.book, name, sheet) !== null || tableNamed(host.book, name) !== null)
    throw fault("ItemAlreadyExists");
  const refersTo = referenceOf(host, args[1]);
  const id = nameId(name, sheet);
  setName(host.book, { id, name, refersTo, comment: optionalText(args, 2) ?? "", sheet });
  return hold("NamedItem", { id });
}

function referenceOf(host: Host, given: unknown): string {
  if (typeof given === "string") return given.replace(/^=/, "");
  const range = given as Held | null;
  if (range === null || typeof range !== "object" || range.type !== "Range") throw fault("InvalidArgument");
  return absoluteAddress(host.book, range.state);
}

type Item = States["NamedItem"];

function nameOf({ book }: Host, { id }: Item): BookName {
  const found = namesOf(book).find((name) => name.id === id);
  if (found === undefined) throw fault("ItemNotFound");
  return found;
}

const areaOf = (host: Host, item: Item): Area | null => areaOfName(host.book, nameOf(host, item));

export const namedItem: Family<Item> = {
  id: (item, host) => nameOf(host, item).name,
  read: {
    Name: (item, host) => nameOf(host, item).name,
    Type: (item, host) => (areaOf(host, item) === null ? "String" : "Range"),
    Value: (item, host) => nameOf(host, item).refersTo,
    Formula: (item, host) => `=${nameOf(host, item).refersTo}`,
    Visible: () => true,
    Comment: (item, host) => nameOf(host, item).comment,
    Scope: (item, host) => (nameOf(host, item).sheet === null ? "Workbook" : "Worksheet"),
  },
  write: {
    Formula: (item, host, value) => setName(host.book, { ...nameOf(host, item), refersTo: referenceOf(host, value) }),
    Comment: (item, host, value) => setName(host.book, { ...nameOf(host, item), comment: String(value) }),
  },
  part: {
    Worksheet: (item, host) => sheetOf(host, item) ?? missing(),
    WorksheetOrNullObject: (item, host) => sheetOf(host, item),
    GetRange: (item, host) => rangeOf(host, item) ?? wrongReference(),
    GetRangeOrNullObject: (item, host) => rangeOf(host, item),
  },
  call: { Delete: (item, host) => removeName(host.book, nameOf(host, item)) },
};

const rangeOf = (host: Host, item: Item): Held | null => {
  const area = areaOf(host, item);
  return area === null ? null : hold("Range", area);
};

const sheetOf = (host: Host, item: Item): Held | null => {
  const { sheet } = nameOf(host, item);
  return sheet === null ? null : hold("Worksheet", { sheet });
};

function wrongReference(): never {
  throw fault("InvalidReference");
}
