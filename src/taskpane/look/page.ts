import { makeStaticStyles } from "@fluentui/react-components";

/** The page itself: no margin, and nothing that could make it scroll sideways. */
export const usePage = makeStaticStyles({
  html: { height: "100%" },
  body: { margin: 0, height: "100%" },
  "*, *::before, *::after": { boxSizing: "border-box" },
  // A list of choices is as wide as its field, not as its longest choice.
  ".fui-Field": { gridTemplateColumns: "minmax(0, 1fr)" },
  ".fui-Select": { minWidth: 0 },
  ".fui-Select__select": { minWidth: 0, textOverflow: "ellipsis" },
});
