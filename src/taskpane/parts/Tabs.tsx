import { makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import { type KeyboardEvent, type ReactNode, useRef } from "react";

export interface TabsProps<Name extends string> {
  readonly label: string;
  readonly tabs: readonly (readonly [Name, string])[];
  readonly selected: Name;
  readonly onSelect: (name: Name) => void;
  /** The id of the panel that the tabs switch. */
  readonly panel: string;
}

const useStyles = makeStyles({
  // Excel draws a menu over the right end of the first line.
  tabs: {
    display: "flex",
    flexShrink: 0,
    columnGap: tokens.spacingHorizontalL,
    padding: `0 40px 0 ${tokens.spacingHorizontalL}`,
    borderBottom: `1px solid ${tokens.colorNeutralStroke2}`,
  },
  tab: {
    minHeight: "40px",
    minWidth: "24px",
    padding: "2px 0 0",
    border: "none",
    borderBottom: "2px solid transparent",
    background: "none",
    color: tokens.colorNeutralForeground2,
    fontFamily: "inherit",
    fontSize: tokens.fontSizeBase300,
    cursor: "pointer",
    ":hover": { color: tokens.colorNeutralForeground1, borderBottomColor: tokens.colorNeutralStroke1 },
    ":focus-visible": { outline: `2px solid ${tokens.colorStrokeFocus2}`, outlineOffset: "-2px" },
    "@media (forced-colors: active)": { borderBottomColor: "Canvas" },
  },
  selected: {
    color: tokens.colorNeutralForeground1,
    fontWeight: tokens.fontWeightSemibold,
    borderBottomColor: tokens.colorCompoundBrandStroke,
    ":hover": { borderBottomColor: tokens.colorCompoundBrandStroke },
    "@media (forced-colors: active)": { borderBottomColor: "Highlight" },
  },
});

/** Tabs that arrows, Home and End walk through; only the selected one is a stop of the Tab key. */
export function Tabs<Name extends string>({ label, tabs, selected, onSelect, panel }: TabsProps<Name>): ReactNode {
  const styles = useStyles();
  const list = useRef<HTMLDivElement>(null);
  const walk = (event: KeyboardEvent): void => {
    const at = tabs.findIndex(([name]) => name === selected);
    const to = placeAfter(event.key, at, tabs.length);
    const next = to === null ? undefined : tabs[to];
    if (to === null || next === undefined) return;
    event.preventDefault();
    onSelect(next[0]);
    list.current?.querySelectorAll<HTMLElement>("[role=tab]")[to]?.focus();
  };
  return (
    <div ref={list} role="tablist" aria-label={label} className={styles.tabs} onKeyDown={walk}>
      {tabs.map(([name, words]) => (
        <button
          key={name}
          type="button"
          role="tab"
          id={tabId(name)}
          aria-selected={name === selected}
          aria-controls={panel}
          tabIndex={name === selected ? 0 : -1}
          className={mergeClasses(styles.tab, name === selected && styles.selected)}
          onClick={() => onSelect(name)}
        >
          {words}
        </button>
      ))}
    </div>
  );
}

export const tabId = (name: string): string => `tab-${name}`;

function placeAfter(key: string, at: number, count: number): number | null {
  switch (key) {
    case "ArrowRight":
      return (at + 1) % count;
    case "ArrowLeft":
      return (at - 1 + count) % count;
    case "Home":
      return 0;
    case "End":
      return count - 1;
    default:
      return null;
  }
}
