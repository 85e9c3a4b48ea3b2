/** A name that an expression may use, and the coefficient it stands for. */
export interface TermName {
  readonly name: string;
  readonly term: number;
}

export type Token =
  | { readonly kind: "term"; readonly term: number }
  | { readonly kind: "number"; readonly value: number }
  | { readonly kind: "sign"; readonly sign: string }
  | { readonly kind: "unknown"; readonly text: string };

/** Takes a text apart into names, numbers and signs; of several names that fit, the longest. */
export function tokensOf(text: string, names: readonly TermName[]): Token[] {
  const longestFirst = names.toSorted((one, other) => other.name.length - one.name.length);
  const tokens: Token[] = [];
  let rest = text.trimStart();
  while (rest !== "") {
    const [token, length] = nameAt(rest, longestFirst) ?? numberAt(rest) ?? signAt(rest) ?? strangerAt(rest);
    tokens.push(token);
    rest = rest.slice(length).trimStart();
  }
  return tokens;
}

type Found = readonly [Token, length: number];

function nameAt(text: string, names: readonly TermName[]): Found | null {
  const lower = text.toLowerCase();
  for (const { name, term } of names) {
    const plain = name.trim().toLowerCase();
    for (const written of [plain, `"${plain}"`]) {
      if (lower.startsWith(written) && endsThere(lower, written.length))
        return [{ kind: "term", term }, written.length];
    }
  }
  return null;
}

/** "Price" is not the beginning of "Prices". */
const endsThere = (text: string, length: number): boolean =>
  !(/[\p{L}\p{N}_]/u.test(text.charAt(length)) && /[\p{L}\p{N}_]/u.test(text.charAt(length - 1)));

function numberAt(text: string): Found | null {
  const [found] = /^(\d+\.?\d*|\.\d+)(e[+-]?\d+)?(?![\p{L}\p{N}_])/iu.exec(text) ?? [];
  return found === undefined ? null : [{ kind: "number", value: Number(found) }, found.length];
}

function signAt(text: string): Found | null {
  const sign = text.charAt(0).replace("−", "-").replace("×", "*");
  return "+-*/()=<>".includes(sign) ? [{ kind: "sign", sign }, 1] : null;
}

/** What stands there up to the next sign is taken for a name. */
function strangerAt(text: string): Found {
  const [found = text] = /^("[^"]*"?|[^+\-*/()=<>]+)/.exec(text) ?? [];
  return [{ kind: "unknown", text: found.replaceAll('"', "").trim() }, found.length];
}
