import { fault } from "./fault.ts";
import type { Held, States, TypeName } from "./held.ts";
import type { Arguments } from "./model.ts";

const isHeld = (value: unknown): value is Held =>
  typeof value === "object" && value !== null && "type" in value && "state" in value;

export function textAt(args: Arguments, index: number): string {
  const value = args[index];
  if (typeof value !== "string" || value === "") throw fault("InvalidArgument");
  return value;
}

export function optionalText(args: Arguments, index: number): string | null {
  const value = args[index] ?? null;
  if (value !== null && typeof value !== "string") throw fault("InvalidArgument");
  return value;
}

/** A whole number, as the API takes row and column counts. */
export function integerAt(args: Arguments, index: number, otherwise?: number): number {
  const value = args[index] ?? otherwise;
  if (typeof value !== "number" || !Number.isInteger(value)) throw fault("InvalidArgument");
  return value;
}

export const flagAt = (args: Arguments, index: number): boolean => args[index] === true;

/** An argument that is an object of the given type. */
export function stateAt<T extends TypeName>(args: Arguments, index: number, type: T): States[T] {
  const value = args[index];
  if (!isHeld(value) || value.type !== type) throw fault("InvalidArgument");
  return value.state as States[T];
}

export function asText(value: unknown): string {
  if (typeof value !== "string") throw fault("InvalidArgument");
  return value;
}

export function asNumber(value: unknown): number {
  if (typeof value !== "number" || !Number.isFinite(value)) throw fault("InvalidArgument");
  return value;
}

export function asFlag(value: unknown): boolean {
  if (typeof value !== "boolean") throw fault("InvalidArgument");
  return value;
}

/** One of a table's keys, without regard to case, as the API takes its enumerations. */
export function oneOf<K extends string>(value: unknown, table: Readonly<Record<K, unknown>>): K {
  const wanted = typeof value === "string" ? value.toLowerCase() : "";
  const found = (Object.keys(table) as K[]).find((key) => key.toLowerCase() === wanted);
  if (found === undefined) throw fault("InvalidArgument");
  return found;
}
