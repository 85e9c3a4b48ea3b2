export interface Progress {
  readonly what: string;
  /** From 0 to 1, or null where it cannot be told. */
  readonly share: number | null;
}

/** A piece of work that someone waits for: it tells how far it is, and ends when it is cancelled. */
export interface Errand {
  readonly signal: AbortSignal;
  readonly progress: (progress: Progress) => void;
}
