import type { ErrorsUsed } from "./errorMatch.ts";
import { type Bench, type Trial, allKinds, comparisons } from "./trial.ts";

/** What the cells give as claimed, under the kind of standard errors that was found elsewhere. */
export function underSameErrors(
  bench: Bench,
  { recipe, fit, compared, used }: Trial,
  wanted: ErrorsUsed | null,
): readonly (number | null)[] {
  const plain = compared.map(({ recomputed }) => recomputed);
  if (wanted === null || used === null || used.kind.name === wanted.kind.name) return plain;
  for (const kind of allKinds(bench, { recipe, fit })) {
    if (kind.name !== wanted.kind.name) continue;
    const law = kind.laws.find(({ name }) => name === wanted.law.name) ?? kind.laws[0]!;
    const same = { kind, law, level: wanted.level };
    return comparisons(bench.claim, { recipe, fit, used: same }).map(({ recomputed }) => recomputed);
  }
  return plain;
}
