/** Excel's limit for the name of a sheet. */
const mostLetters = 31;

/**
 * A name that Excel takes for a new sheet and that no sheet has yet: "Repairs answer", "Repairs answer 2".
 * Names differ without regard to case; some characters and the word History are Excel's own.
 */
export function freeSheetName(wanted: string, taken: readonly string[]): string {
  const used = new Set([...taken, "History"].map((name) => name.toLowerCase()));
  const plain =
    wanted
      .replaceAll(/[\\/?*[\]:\p{Cc}]/gu, " ")
      .replaceAll(/\s+/g, " ")
      .trim() || "Footing";
  for (let count = 1; ; count++) {
    const name = withCount(plain, count === 1 ? "" : ` ${count}`);
    if (!used.has(name.toLowerCase())) return name;
  }
}

const withCount = (name: string, count: string): string =>
  `${name.slice(0, mostLetters - count.length).replaceAll(/^['\s]+|['\s]+$/g, "")}${count}`;
