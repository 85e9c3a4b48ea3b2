import { makeStyles, tokens } from "@fluentui/react-components";

/** Tables of models: as wide as the pane for two of them, and scrolling in a box of their own for more. */
export const useTableLook = makeStyles({
  box: {
    overflowX: "auto",
    ":focus-visible": { outline: `2px solid ${tokens.colorStrokeFocus2}`, outlineOffset: "2px" },
  },
  table: {
    width: "100%",
    borderCollapse: "collapse",
    fontSize: tokens.fontSizeBase200,
    lineHeight: "17px",
    fontVariantNumeric: "tabular-nums",
  },
  model: {
    minWidth: "84px",
    fontWeight: tokens.fontWeightSemibold,
    textAlign: "right",
    verticalAlign: "bottom",
    padding: "4px 0 4px 6px",
    overflowWrap: "anywhere",
  },
  driver: {
    textAlign: "left",
    fontWeight: tokens.fontWeightSemibold,
    padding: "10px 0 2px",
    borderTop: `1px solid ${tokens.colorNeutralStroke2}`,
    overflowWrap: "anywhere",
  },
  label: {
    fontWeight: tokens.fontWeightRegular,
    textAlign: "left",
    verticalAlign: "top",
    padding: "2px 4px 2px 0",
    color: tokens.colorNeutralForeground3,
  },
  short: { whiteSpace: "nowrap" },
  cell: { textAlign: "right", verticalAlign: "top", padding: "2px 0 2px 6px", overflowWrap: "anywhere" },
});
