import type { Problem } from "../../core/problem/problem.ts";
import type { WrittenBlock } from "../../sheet/written.ts";
import type { KeptPart } from "../keeper.ts";
import { type Reader, listOf, malformed, number, objectOf, oneOf, orNull, since, text } from "./readers.ts";
import { readSetup } from "./readSetup.ts";
import {
  type Anchor,
  type ComparisonRecord,
  type ModelRecord,
  type SheetRecord,
  type StoredBook,
  type StoredSetup,
  emptyBook,
} from "./storedBook.ts";

/** Of the XML part that holds what Footing keeps; it outlives a new version and a new address of the add-in. */
export const namespace = "urn:footing:workbook";
/** Raised when what older versions wrote, or would make of it, can no longer be read. */
const format = 1;

/** What a workbook keeps, and the parts that are left alone, with the reason. */
export interface Kept {
  readonly book: StoredBook;
  /** The part it stands in; null where there is none yet. */
  readonly part: string | null;
  readonly leftAlone: readonly Problem[];
}

/** Reads the parts of our namespace: the first that can be read is the one that is written to. */
export function readKept(parts: readonly KeptPart[]): Kept {
  let kept: Kept = { book: emptyBook, part: null, leftAlone: [] };
  for (const part of parts) {
    const read = readPart(part);
    if (!("book" in read)) kept = { ...kept, leftAlone: [...kept.leftAlone, read] };
    else if (kept.part === null) kept = { ...kept, book: read.book, part: part.id };
  }
  return kept;
}

const anchor: Reader<Anchor> = objectOf<Anchor>({ kind: oneOf("table", "name"), name: text });

const setupMembers = { name: text, anchor, address: text, setup: readSetup } as const;

const setup: Reader<StoredSetup> = objectOf<StoredSetup>(setupMembers);

const block: Reader<WrittenBlock> = objectOf<WrittenBlock>({
  row: number,
  column: number,
  rows: number,
  columns: number,
  marks: text,
});

const record: Reader<SheetRecord> = objectOf<SheetRecord>({
  id: text,
  kind: oneOf("live", "kept"),
  setup: readSetup,
  anchor,
  address: text,
  fingerprint: text,
  written: orNull(listOf(block)),
});

const comparison: Reader<ComparisonRecord> = objectOf<ComparisonRecord>({
  id: text,
  kind: oneOf("comparison"),
  models: listOf(objectOf<ModelRecord>({ ...setupMembers, fingerprint: text })),
  written: listOf(block),
});

const book: Reader<StoredBook> = objectOf<StoredBook>({
  setups: listOf(setup),
  sheets: listOf(record),
  comparisons: since(listOf(comparison), []),
});

function readPart({ id, xml }: KeptPart): { readonly book: StoredBook } | Problem {
  const body = xml.replace(/^\s*<\?xml[^>]*\?>\s*/, "");
  const found = /^<(?:[\w.-]+:)?footing\b([^>]*)>([^<]*)<\/(?:[\w.-]+:)?footing>\s*$/.exec(body);
  const version = Number(/\bversion\s*=\s*["'](\d+)["']/.exec(found?.[1] ?? /^<[^>]*>/.exec(body)?.[0] ?? "")?.[1]);
  if (version > format) return { code: "stored-by-newer", version, own: format };
  const read = found === null || version !== format ? malformed : book(parsed(unescaped(found[2] ?? "")));
  return read === malformed ? { code: "stored-unreadable", part: id } : { book: read };
}

/** undefined where the text is no JSON. */
function parsed(json: string): unknown {
  try {
    return JSON.parse(json) as unknown;
  } catch {
    return undefined;
  }
}

export const partText = (kept: StoredBook): string =>
  `<footing xmlns="${namespace}" version="${format}">${escaped(JSON.stringify(kept))}</footing>`;

/** JSON itself escapes control characters and halves of pairs; two more signs may not stand in XML. */
const escaped = (json: string): string =>
  json
    .replaceAll("&", "&amp;")
    .replaceAll("<", "&lt;")
    .replaceAll(">", "&gt;")
    .replaceAll(/[\uFFFE\uFFFF]/g, (sign) => `\\u${sign.charCodeAt(0).toString(16)}`);

const entities: Readonly<Record<string, string>> = { lt: "<", gt: ">", amp: "&", quot: '"', apos: "'" };

/** The host may write the same text with other entities than were given. */
const unescaped = (xml: string): string =>
  xml.replaceAll(/&[#\w]+;/g, (entity) => {
    const number = /^&#(x?)([\da-f]+);$/i.exec(entity);
    if (number !== null) return String.fromCodePoint(parseInt(number[2] ?? "", number[1] === "" ? 10 : 16));
    return entities[entity.slice(1, -1)] ?? entity;
  });
