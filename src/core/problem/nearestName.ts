/**
 * The known name that a mistyped word most likely stands for, free of case and outer blanks.
 * Edits are letters put in, left out, changed, or swapped with their neighbour; up to a third of the word may be edits.
 * Where none is so close, a name that begins with the word or contains it will do.
 * @returns null where no candidate is near enough to be offered.
 * @see Damerau (1964), Communications of the ACM 7, 171-176 (the four edits).
 */
export function nearestName(word: string, candidates: readonly string[]): string | null {
  const sought = plain(word);
  const allowed = Math.max(1, Math.floor(sought.length / 3));
  let nearest: string | null = null;
  let least = allowed + 1;
  for (const candidate of candidates) {
    const distance = editDistance(sought, plain(candidate), allowed);
    if (distance < least) [nearest, least] = [candidate, distance];
  }
  return nearest ?? longerName(sought, candidates);
}

const plain = (text: string): string => text.trim().toLowerCase();

/** Three letters are the fewest that say something about the whole. */
const fewestLetters = 3;

function longerName(sought: string, candidates: readonly string[]): string | null {
  if (sought.length < fewestLetters) return null;
  const beginning = candidates.find((candidate) => plain(candidate).startsWith(sought));
  return beginning ?? candidates.find((candidate) => plain(candidate).includes(sought)) ?? null;
}

/** Edits between two words; more than `most` are not counted out. */
function editDistance(a: string, b: string, most: number): number {
  if (Math.abs(a.length - b.length) > most) return most + 1;
  let beforeLast: number[] = [];
  let last = Array.from({ length: b.length + 1 }, (_, j) => j);
  for (let i = 1; i <= a.length; i++) {
    const row = [i];
    for (let j = 1; j <= b.length; j++) {
      const changed = last[j - 1]! + (a[i - 1] === b[j - 1] ? 0 : 1);
      const swapped = i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1];
      row[j] = Math.min(last[j]! + 1, row[j - 1]! + 1, changed, swapped ? beforeLast[j - 2]! + 1 : Infinity);
    }
    [beforeLast, last] = [last, row];
  }
  return last[b.length]!;
}
