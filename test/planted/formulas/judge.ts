import type { BookReview } from "../../../src/core/review/claimReview.ts";
import type { FormulaBook } from "./books.ts";

/** Whether a review says of a workbook what was planted there; else what it says. */
export function judgeFormulas({ said }: FormulaBook, { claims, craft, unread }: BookReview): string | null {
  if (said === null) return soundly({ claims, craft, unread });
  if ("unread" in said) {
    return unread.some(({ why }) => said.unread.test(why))
      ? null
      : `not said, but ${unread.map(({ why }) => why).join(" ")}`;
  }
  const codes = [...claims.flatMap(({ findings }) => findings), ...craft].map(({ code }) => code);
  return codes.includes(said.finding)
    ? null
    : `${said.finding} not found, but ${codes.join(", ") || "nothing"}; ${unread.map(({ why }) => why).join(" ")}`;
}

/** One report, all of its numbers out of the cells, and nothing that would change a conclusion. */
function soundly({ claims, craft, unread }: BookReview): string | null {
  if (claims.length !== 1 || unread.length > 0) {
    return `${claims.length} reports found, ${unread.map(({ why }) => why).join(" ")}`;
  }
  const { compared, findings, verdict } = claims[0]!;
  const wrong = compared.filter(({ agrees }) => !agrees);
  if (wrong.length > 0) return `${wrong.length} numbers are said to differ`;
  const told = [...findings, ...craft].filter(({ rank }) => rank !== "worth knowing");
  return told.length === 0 ? null : `${told.map(({ code }) => code).join(", ")}: ${verdict}`;
}
