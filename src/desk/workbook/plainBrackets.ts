import { LexerTreeBuilder } from "@univerjs/engine-formula";
import type { Grid } from "./grid.ts";
import { bracketed } from "./structuredReferences.ts";

const brackets = new RegExp(bracketed, "gu");

/** The name of a column in brackets, letters put in the place of signs. */
const plain = (formula: string): string =>
  formula.replaceAll(brackets, (part) => (part.includes("'") ? `[${"x".repeat(part.length - 2)}]` : part));

/**
 * The grid's reader of formulas takes an escaped sign in a column's name, [Driver''s '[x']], for the sign itself, and
 * reads every formula after it wrongly. It gets such names in plain letters; what it gives back has the names again.
 */
export function readPlainBrackets({ injector }: Grid): void {
  const reader = injector.get(LexerTreeBuilder);
  const treeBuilder = reader.treeBuilder.bind(reader);
  reader.treeBuilder = (formula, ...rest) => treeBuilder(plain(formula), ...rest);
  const sequence = reader.sequenceNodesBuilder.bind(reader);
  reader.sequenceNodesBuilder = (formula) => {
    const asked = plain(formula);
    const nodes = sequence(asked);
    if (asked === formula) return nodes;
    const text = formula.replace(/^=/, "");
    return nodes?.map((node) =>
      typeof node === "string" ? node : { ...node, token: text.slice(node.startIndex, node.endIndex + 1) },
    );
  };
}
