import { tokens } from "@fluentui/react-components";

/** What stands below a line that opens: one field under the other, set in from the line. */
export const underLine = {
  display: "grid",
  gridTemplateColumns: "minmax(0, 1fr)",
  rowGap: tokens.spacingVerticalS,
  padding: `0 0 ${tokens.spacingVerticalS} 16px`,
} as const;
