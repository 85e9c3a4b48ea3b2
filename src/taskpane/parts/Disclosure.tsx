import { makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import { type ReactNode, useId, useState } from "react";

export interface DisclosureProps {
  readonly label: ReactNode;
  readonly children: ReactNode;
}

const useStyles = makeStyles({
  button: {
    display: "flex",
    alignItems: "center",
    columnGap: tokens.spacingHorizontalXS,
    width: "100%",
    minHeight: "28px",
    padding: 0,
    border: "none",
    background: "none",
    color: tokens.colorBrandForegroundLink,
    font: "inherit",
    fontSize: tokens.fontSizeBase200,
    textAlign: "left",
    cursor: "pointer",
    borderRadius: tokens.borderRadiusSmall,
    ":hover": { textDecorationLine: "underline" },
    ":focus-visible": { outline: `2px solid ${tokens.colorStrokeFocus2}`, outlineOffset: "1px" },
    "@media (forced-colors: active)": { color: "LinkText" },
  },
  mark: {
    width: "12px",
    flexShrink: 0,
    transition: "transform 80ms",
    "@media (prefers-reduced-motion)": { transition: "none" },
  },
  open: { transform: "rotate(90deg)" },
});

/** Something more that opens under its own words. */
export function Disclosure({ label, children }: DisclosureProps): ReactNode {
  const styles = useStyles();
  const [open, setOpen] = useState(false);
  const id = useId();
  return (
    <div>
      <button
        type="button"
        className={styles.button}
        aria-expanded={open}
        aria-controls={id}
        onClick={() => setOpen(!open)}
      >
        <Turn className={mergeClasses(styles.mark, open && styles.open)} />
        <span>{label}</span>
      </button>
      <div id={id} hidden={!open}>
        {open && children}
      </div>
    </div>
  );
}

export const Turn = ({ className }: { readonly className: string }): ReactNode => (
  <svg className={className} viewBox="0 0 12 12" height="12" aria-hidden="true">
    <path d="M4 2.5 8 6l-4 3.5" fill="none" stroke="currentColor" strokeWidth="1.4" />
  </svg>
);
