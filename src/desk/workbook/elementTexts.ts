import { numfmt } from "@univerjs/core";
import type { BlankArrival } from "./metadata.ts";

/** One element of an argument; null is a blank cell. */
export type Element = { readonly value: number | string | boolean } | { readonly error: string } | null;

type Text = { readonly text: string } | { readonly error: string };

interface Rules {
  readonly blank: BlankArrival;
  readonly errorsPass: boolean;
}

const noValue = { error: "#VALUE!" } as const;
const json = (value: unknown): Text => ({ text: JSON.stringify(value) });

/** Excel converts for every declared type but "any", and makes no call where it cannot. */
export function elementText(element: Element, type: string, rules: Rules): Text {
  if (element !== null && "error" in element) return errorText(element.error, type, rules);
  const value = element === null ? null : element.value;
  switch (type) {
    case "number":
      return numberText(value);
    case "string":
      return json(typeof value === "boolean" ? String(value).toUpperCase() : String(value ?? ""));
    case "boolean":
      return booleanText(value);
    default:
      return json(value ?? rules.blank);
  }
}

/** By its type the client's runtime recognises an error value. */
export const errorMark = "CustomFunctionError";

function errorText(error: string, type: string, { errorsPass }: Rules): Text {
  return errorsPass && type === "any" ? json({ type: errorMark, code: error }) : { error };
}

function numberText(value: number | string | boolean | null): Text {
  if (value === null) return json(0);
  if (typeof value !== "string") return json(Number(value));
  const read = numfmt.parseValue(value);
  return read === null || typeof read.v !== "number" ? noValue : json(read.v);
}

function booleanText(value: number | string | boolean | null): Text {
  if (value === null) return json(false);
  if (typeof value !== "string") return json(Boolean(value));
  const read = numfmt.parseBool(value);
  return read === null ? noValue : json(read.v);
}
