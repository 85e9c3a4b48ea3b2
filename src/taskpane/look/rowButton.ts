import { tokens } from "@fluentui/react-components";

/** A button as wide as its row, whose words stand like those of the row: for lists whose entries open. */
export const rowButton = {
  display: "grid",
  columnGap: tokens.spacingHorizontalXS,
  width: "100%",
  padding: `${tokens.spacingVerticalS} 0`,
  border: "none",
  background: "none",
  color: "inherit",
  font: "inherit",
  fontSize: tokens.fontSizeBase200,
  lineHeight: "17px",
  textAlign: "left",
  cursor: "pointer",
  borderRadius: tokens.borderRadiusSmall,
  overflowWrap: "anywhere",
  ":hover": { color: tokens.colorBrandForegroundLink },
  ":focus-visible": { outline: `2px solid ${tokens.colorStrokeFocus2}`, outlineOffset: "-2px" },
} as const;
