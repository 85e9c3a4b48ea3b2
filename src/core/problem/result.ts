import type { Problem } from "./problem.ts";

/** Either a value or a fault the user can mend. Core never throws for a user's fault. */
export type Result<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly problem: Problem };

export const success = <T>(value: T): Result<T> => ({ ok: true, value });

export const failure = (problem: Problem): { readonly ok: false; readonly problem: Problem } => ({
  ok: false,
  problem,
});
