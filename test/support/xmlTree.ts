export interface Element {
  readonly name: string;
  readonly attributes: Readonly<Record<string, string>>;
  readonly children: readonly Element[];
  readonly text: string;
}

interface Open {
  readonly name: string;
  readonly attributes: Record<string, string>;
  readonly children: Element[];
  text: string;
}

const token = /<!--.*?-->|<\?.*?\?>|<(\/?)([\w:.-]+)((?:\s+[\w:.-]+="[^"]*")*)\s*(\/?)>|([^<]+)/gs;

/** The root element of a well-formed document without entities; throws where tags do not match. */
export function parseXml(text: string): Element {
  const document: Open = { name: "", attributes: {}, children: [], text: "" };
  const open: Open[] = [document];
  for (const [, closing, name, attributes = "", empty, content] of text.matchAll(token)) {
    const current = open.at(-1)!;
    if (content !== undefined) current.text += content.trim();
    if (name === undefined) continue;
    if (closing === "/") close(open, name);
    else {
      const element: Open = { name, attributes: attributesOf(attributes), children: [], text: "" };
      current.children.push(element);
      if (empty !== "/") open.push(element);
    }
  }
  if (open.length !== 1 || document.children.length !== 1) throw new Error("The document is not closed.");
  return document.children[0]!;
}

function close(open: Open[], name: string): void {
  const closed = open.pop();
  if (closed?.name !== name) throw new Error(`</${name}> closes <${closed?.name ?? ""}>.`);
}

const attributesOf = (text: string): Record<string, string> =>
  Object.fromEntries([...text.matchAll(/([\w:.-]+)="([^"]*)"/g)].map(([, name, value]) => [name!, value!]));

/** The element itself and all below it. */
export function* everyElement(element: Element): Generator<Element> {
  yield element;
  for (const child of element.children) yield* everyElement(child);
}
