import type { RowsSummary } from "../../core/answer/answer.ts";
import { counted } from "../../core/problem/spots.ts";

/** What rows are to each other, after "94 rows": ", monthly from January 2018 to December 2025, no gaps". */
export function rowsInWords(rows: RowsSummary): string {
  switch (rows.kind) {
    case "cases":
      return "each a separate case";
    case "groups":
      return rows.second === null
        ? `in ${counted(rows.groups, "group")} by ${rows.by}`
        : `in ${counted(rows.groups, "group")} by ${rows.by} and ${rows.second.groups} by ${rows.second.by}`;
    case "time": {
      const gaps = rows.gaps === 0 ? "no gaps" : `${counted(rows.gaps, "gap")}: ${gapList(rows)}`;
      return `${rows.period.name} from ${rows.first} to ${rows.last}, ${gaps}`;
    }
  }
}

const gapList = ({ gaps, gapLabels }: Extract<RowsSummary, { kind: "time" }>): string =>
  [...gapLabels, ...(gaps > gapLabels.length ? [`${gaps - gapLabels.length} more`] : [])].join(", ");
