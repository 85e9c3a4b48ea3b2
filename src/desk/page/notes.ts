/** What the bar says beneath its buttons. */
export interface Note {
  /** A fault is told at once, a word when there is time. */
  readonly kind: "fault" | "word";
  readonly text: string;
}

export const cannotRead = (file: string, because: string): Note => ({
  kind: "fault",
  text: `${file} cannot be read: ${because}.`,
});

/** What is said of a workbook as it opens. */
export function openedNote(loosened: readonly string[] = []): Note | null {
  if (loosened.length === 0) return null;
  return {
    kind: "word",
    text: `Since this workbook was saved for LibreOffice, something was changed within ${listed(loosened)}. What was put there stays; every other cell of the result has a formula of its own now and goes on being calculated.`,
  };
}

/** @param left - results that LibreOffice does not show. */
export function savedForLibreOffice(left: readonly string[]): Note {
  const shown =
    left.length === 0
      ? "Saved for LibreOffice: every figure shows there as it is now."
      : `Saved for LibreOffice: figures show there as they are now, but for ${listed(left)}, which can only show #NAME?.`;
  return {
    kind: "word",
    text: `${shown} LibreOffice cannot calculate Footing's functions: if you change a cell there, the figures that depend on it show #NAME? until the workbook is opened here again.`,
  };
}

/** As many as one reads at a glance. */
const mostListed = 3;

function listed(areas: readonly string[]): string {
  const [last = "", ...others] = areas.slice(0, mostListed).reverse();
  const more = areas.length - mostListed;
  if (more > 0) return `${areas.slice(0, mostListed).join(", ")} and ${more} more`;
  return others.length === 0 ? last : `${others.reverse().join(", ")} and ${last}`;
}
