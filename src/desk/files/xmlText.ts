/** The namespace prefix that a part writes before its elements, with its colon: "" or "x:". */
export const prefixOf = (part: string): string =>
  /<(\w+:)?(?:workbook|styleSheet|metadata|Types|Relationships)\b/.exec(part)?.[1] ?? "";

/** Elements written without a prefix, with one. */
export const withPrefix = (elements: string, prefix: string): string =>
  prefix === "" ? elements : elements.replace(/<(\/?)(?=\w)/g, `<$1${prefix}`);

/** What stands between the tags of an element; "" where it is empty or missing. */
export const insideOf = (part: string, element: string): string =>
  new RegExp(`<${element}(?: [^>]*)?(?<!/)>(.*?)</${element}>`, "s").exec(part)?.[1] ?? "";

export const countOf = (text: string, element: string): number =>
  text.match(new RegExp(`<${element}[ />]`, "g"))?.length ?? 0;

/** A list of the part with children put at its end, its count renewed; null where the part has no such list. */
export function appendTo(part: string, list: string, children: string): string | null {
  const open = new RegExp(`<${list}((?: [^>]*?)?)(?:/>|>(.*?)</${list}>)`, "s");
  if (!open.test(part)) return null;
  return part.replace(open, (_, attributes: string, inside: string | undefined) => {
    const rest = attributes.replace(/ count="\d*"/, "");
    return `<${list}${rest}>${inside ?? ""}${children}</${list}>`;
  });
}

const entities: Readonly<Record<string, string>> = { "&": "&amp;", "<": "&lt;", ">": "&gt;", '"': "&quot;" };

export const escapeXml = (text: string): string => text.replace(/[&<>"]/g, (sign) => entities[sign]!);

export const unescapeXml = (text: string): string => text.replace(/&(?:amp|lt|gt|quot);/g, (entity) => signs[entity]!);

const signs: Readonly<Record<string, string>> = { "&amp;": "&", "&lt;": "<", "&gt;": ">", "&quot;": '"' };
