import { makeStaticStyles } from "@fluentui/react-components";

/** The page itself: no margin, and nothing that could make it scroll sideways. */
export const usePage = makeStaticStyles({
  html: { height: "100%" },
  body: { margin: 0, height: "100%" },
  "*, *::before, *::after": { boxSizing: "border-box" },
});
