const lineLength = 100;

/** A sentence wrapped at words. */
export function wrapped(sentence: string): string {
  const lines: string[] = [];
  for (const word of sentence.split(" ")) {
    const last = lines.at(-1);
    if (last !== undefined && last.length + word.length < lineLength) lines[lines.length - 1] = `${last} ${word}`;
    else lines.push(word);
  }
  return lines.join("\n  ");
}
