/** What was read of a formula, or why it could not be read, as a sentence. */
export type Reading<T> = { readonly ok: true; readonly value: T } | { readonly ok: false; readonly why: string };

export const read = <T>(value: T): Reading<T> => ({ ok: true, value });

export const unread = (why: string): { readonly ok: false; readonly why: string } => ({ ok: false, why });
