export type GuardName = "collinearity" | "influence" | "trending" | "breaks" | "time" | "groups";

/** Something beside the tests that a reader should know before relying on the figures. */
export interface Guard {
  readonly guard: GuardName;
  readonly finding: "nothing found" | "worth knowing" | "look into it";
  /** What was found, sentence by sentence; one sentence where nothing was. */
  readonly sentences: readonly string[];
}

/** "Price", "Price and Fuel", "Price, Fuel and Rent". */
export function namesInWords(names: readonly string[]): string {
  const last = names.at(-1) ?? "";
  return names.length < 2 ? last : `${names.slice(0, -1).join(", ")} and ${last}`;
}
