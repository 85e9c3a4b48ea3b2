import { createDarkTheme, createLightTheme } from "@fluentui/react-components";
import type { BrandVariants, Theme } from "@fluentui/react-components";

/** The deep teal of Footing's mark, from near black to near white. */
const teal: BrandVariants = {
  10: "#03090b",
  20: "#071a20",
  30: "#0a2831",
  40: "#0c3440",
  50: "#0d404e",
  60: "#0f4c5c",
  70: "#17596b",
  80: "#1d677b",
  90: "#2b778c",
  100: "#3f889d",
  110: "#5499ae",
  120: "#6babbf",
  130: "#85bdce",
  140: "#a1cfdd",
  150: "#c0e1eb",
  160: "#e1f2f7",
};

/** Paper and ink rather than panels: one ground, hairlines, no shadows. */
const light: Theme = {
  ...createLightTheme(teal),
  colorBrandBackground: teal[60],
  colorBrandBackgroundHover: teal[50],
  colorBrandBackgroundPressed: teal[40],
  colorBrandForeground1: teal[70],
  colorBrandForegroundLink: teal[70],
  colorCompoundBrandStroke: teal[60],
  colorNeutralForeground3: "#55595c",
  colorNeutralStroke1: "#8a8f92",
  colorNeutralStroke2: "#dcdfe0",
};

const dark: Theme = {
  ...createDarkTheme(teal),
  colorNeutralBackground1: "#1c1f21",
  colorNeutralBackground2: "#24282a",
  colorBrandBackground: teal[80],
  colorBrandBackgroundHover: teal[70],
  colorBrandBackgroundPressed: teal[60],
  colorBrandForeground1: teal[130],
  colorBrandForegroundLink: teal[130],
  colorCompoundBrandStroke: teal[120],
  colorNeutralForeground3: "#b4b9bc",
  colorNeutralStroke1: "#7d8386",
  colorNeutralStroke2: "#3a3f42",
};

export const themeFor = (isDark: boolean): Theme => (isDark ? dark : light);
