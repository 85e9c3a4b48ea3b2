/** Keeps signs with their numbers when a sentence breaks over lines, "95 %", "p = 0.03", and writes a minus as one. */
export const keepTogether = (sentence: string): string =>
  sentence
    .replaceAll(/(?<=^|[\s(])-(?=\d)/g, "−")
    .replaceAll(/ %/g, "\u00a0%")
    .replaceAll(/\bp = /g, "p\u00a0=\u00a0")
    .replaceAll(/\bp under /g, "p\u00a0under\u00a0");
