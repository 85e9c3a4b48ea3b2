import { makeStyles, tokens } from "@fluentui/react-components";

/** A reading face for what the pane concludes; its figures stand in columns. */
const serif = `"Sitka Text", Charter, "Iowan Old Style", Georgia, "Liberation Serif", serif`;

/** The pane's few voices: conclusions, plain text, remarks, and the small heads over a group. */
export const useType = makeStyles({
  verdict: {
    fontFamily: serif,
    fontSize: "16px",
    lineHeight: "23px",
    margin: `0 0 ${tokens.spacingVerticalM}`,
    textWrap: "pretty",
    overflowWrap: "anywhere",
  },
  body: {
    margin: `0 0 ${tokens.spacingVerticalS}`,
    fontSize: tokens.fontSizeBase300,
    lineHeight: tokens.lineHeightBase300,
  },
  remark: {
    margin: `0 0 ${tokens.spacingVerticalXS}`,
    fontSize: tokens.fontSizeBase200,
    lineHeight: "17px",
    color: tokens.colorNeutralForeground3,
    textWrap: "pretty",
    overflowWrap: "anywhere",
  },
  head: {
    margin: `${tokens.spacingVerticalL} 0 ${tokens.spacingVerticalS}`,
    paddingTop: tokens.spacingVerticalS,
    borderTop: `1px solid ${tokens.colorNeutralStroke2}`,
    fontSize: tokens.fontSizeBase200,
    lineHeight: tokens.lineHeightBase200,
    fontWeight: tokens.fontWeightSemibold,
    color: tokens.colorNeutralForeground2,
  },
  title: {
    margin: `0 0 ${tokens.spacingVerticalS}`,
    fontSize: tokens.fontSizeBase400,
    lineHeight: tokens.lineHeightBase400,
    fontWeight: tokens.fontWeightSemibold,
    overflowWrap: "anywhere",
    ":focus": { outlineStyle: "none" },
    ":focus-visible": { outline: `2px solid ${tokens.colorStrokeFocus2}`, outlineOffset: "2px" },
  },
  subhead: {
    margin: `${tokens.spacingVerticalM} 0 ${tokens.spacingVerticalXS}`,
    fontSize: tokens.fontSizeBase200,
    lineHeight: tokens.lineHeightBase200,
    fontWeight: tokens.fontWeightSemibold,
  },
  footnote: {
    margin: `${tokens.spacingVerticalL} 0 0`,
    paddingTop: tokens.spacingVerticalS,
    borderTop: `1px solid ${tokens.colorNeutralStroke2}`,
    fontSize: tokens.fontSizeBase200,
    lineHeight: "17px",
    color: tokens.colorNeutralForeground3,
  },
  hidden: {
    position: "absolute",
    width: "1px",
    height: "1px",
    overflow: "hidden",
    clipPath: "inset(50%)",
    whiteSpace: "nowrap",
  },
});
