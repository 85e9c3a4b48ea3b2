import { generateRandomId } from "@univerjs/core";
import { asText, textAt } from "./arguments.ts";
import { fault } from "./fault.ts";
import type { Host } from "./host.ts";
import { hold, type Held, type States } from "./held.ts";
import type { Arguments, Family } from "./model.ts";

function missing(): never {
  throw fault("ItemNotFound");
}

export const settings: Family<null> = {
  items: (_state, { book }) => [...book.settings.keys()].map((key) => hold("Setting", { key })),
  part: {
    "": (_state, host, args) => setting(host, args) ?? missing(),
    GetItemOrNullObject: (_state, host, args) => setting(host, args),
    Add: (_state, { book }, args) => {
      const key = textAt(args, 0);
      book.settings.set(key, args[1] ?? null);
      return hold("Setting", { key });
    },
  },
  call: { GetCount: (_state, { book }) => book.settings.size },
};

function setting({ book }: Host, args: Arguments): Held | null {
  const key = textAt(args, 0);
  return book.settings.has(key) ? hold("Setting", { key }) : null;
}

export const oneSetting: Family<States["Setting"]> = {
  id: ({ key }) => key,
  read: {
    Key: ({ key }) => key,
    Value: ({ key }, { book }) => (book.settings.has(key) ? book.settings.get(key) : missing()),
  },
  write: {
    Value: ({ key }, { book }, value) => {
      book.settings.set(key, value);
    },
  },
  call: {
    Delete: ({ key }, { book }) => {
      book.settings.delete(key);
    },
  },
};

export const customXmlParts: Family<null> = {
  items: (_state, { book }) => book.customXml.map((part) => hold("CustomXmlPart", part)),
  part: {
    "": (_state, host, args) => partBy(host, textAt(args, 0)) ?? missing(),
    GetItemOrNullObject: (_state, host, args) => partBy(host, textAt(args, 0)),
    GetByNamespace: (_state, _host, args) => hold("CustomXmlPartScopedCollection", { namespace: textAt(args, 0) }),
    Add: (_state, { book }, args) => {
      const part = { id: `{${generateRandomId(12)}}`, xml: wellFormed(textAt(args, 0)) };
      book.customXml.push(part);
      return hold("CustomXmlPart", part);
    },
  },
  call: { GetCount: (_state, { book }) => book.customXml.length },
};

const partBy = ({ book }: Host, id: string): Held | null => {
  const part = book.customXml.find((one) => one.id === id);
  return part === undefined ? null : hold("CustomXmlPart", part);
};

/** Excel takes one element and refuses text that is no XML; the stand-in looks at the outermost element alone. */
function wellFormed(xml: string): string {
  const body = xml.trim().replace(/^<\?xml[^>]*\?>\s*/, "");
  const open = /^<([\w:.-]+)(\s[^<>]*?)?(\/?)>/.exec(body);
  if (open === null) throw fault("InvalidArgument");
  const closed = open[3] === "/" ? body === open[0] : body.endsWith(`</${open[1] ?? ""}>`);
  if (!closed) throw fault("InvalidArgument");
  return xml;
}

/** The namespace of the outermost element: its own xmlns, or that of its prefix. */
function namespaceOf(xml: string): string {
  const root = /<([\w.-]+:)?[\w.-]+((?:\s[^<>]*)?)>/.exec(xml.replace(/<\?xml[^>]*\?>/, ""));
  const attribute = root?.[1] === undefined ? "xmlns" : `xmlns:${root[1].slice(0, -1)}`;
  const found = new RegExp(`\\s${attribute}\\s*=\\s*["']([^"']*)["']`).exec(root?.[2] ?? "");
  return found?.[1] ?? "";
}

type Scoped = States["CustomXmlPartScopedCollection"];

const within = ({ book }: Host, { namespace }: Scoped): readonly Held[] =>
  book.customXml.filter(({ xml }) => namespaceOf(xml) === namespace).map((part) => hold("CustomXmlPart", part));

/** The only part of a namespace; several are as wrong as none. */
function only(host: Host, state: Scoped): Held | null {
  const [first, second] = within(host, state);
  return first !== undefined && second === undefined ? first : null;
}

function scopedBy(state: Scoped, host: Host, args: Arguments): Held | null {
  const part = partBy(host, textAt(args, 0));
  const inside = part?.type === "CustomXmlPart" && namespaceOf(part.state.xml) === state.namespace;
  return inside ? part : null;
}

export const scopedXmlParts: Family<Scoped> = {
  items: (state, host) => within(host, state),
  part: {
    "": (state, host, args) => scopedBy(state, host, args) ?? missing(),
    GetItemOrNullObject: scopedBy,
    GetOnlyItem: (state, host) => only(host, state) ?? severalOrNone(),
    GetOnlyItemOrNullObject: (state, host) => only(host, state),
  },
  call: { GetCount: (state, host) => within(host, state).length },
};

function severalOrNone(): never {
  throw fault("GeneralException");
}

export const customXmlPart: Family<States["CustomXmlPart"]> = {
  id: ({ id }) => id,
  read: { Id: ({ id }) => id, NamespaceUri: ({ xml }) => namespaceOf(xml) },
  call: {
    GetXml: ({ xml }) => xml,
    SetXml: (part, _host, args) => {
      part.xml = wellFormed(asText(args[0]));
    },
    Delete: (part, { book }) => {
      book.customXml.splice(book.customXml.indexOf(part), 1);
    },
  },
};
