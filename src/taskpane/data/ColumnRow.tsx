import { Select, makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import { type ReactNode, useId, useState } from "react";
import type { ColumnSetup, Role } from "../../app/setup.ts";
import { Turn } from "../parts/Disclosure.tsx";
import { usePane } from "../paneContext.ts";
import { ColumnPicture } from "../pictures/ColumnPicture.tsx";
import { ColumnDetails } from "./ColumnDetails.tsx";
import { holdsInWords, unusableCells } from "./columnWords.ts";
import type { ColumnInHand } from "./columnInHand.ts";

const useStyles = makeStyles({
  row: {
    display: "grid",
    gridTemplateColumns: "minmax(0, 1fr) 44px 104px",
    columnGap: tokens.spacingHorizontalS,
    alignItems: "center",
    padding: `${tokens.spacingVerticalXS} 0`,
    borderTop: `1px solid ${tokens.colorNeutralStroke2}`,
  },
  toggle: {
    display: "grid",
    gridTemplateColumns: "12px minmax(0, 1fr)",
    columnGap: tokens.spacingHorizontalXS,
    alignItems: "center",
    minHeight: "36px",
    padding: 0,
    border: "none",
    background: "none",
    color: "inherit",
    font: "inherit",
    textAlign: "left",
    cursor: "pointer",
    borderRadius: tokens.borderRadiusSmall,
    ":hover": { color: tokens.colorBrandForegroundLink },
    ":focus-visible": { outline: `2px solid ${tokens.colorStrokeFocus2}`, outlineOffset: "1px" },
  },
  turn: { width: "12px", color: tokens.colorNeutralForeground3 },
  open: { transform: "rotate(90deg)" },
  name: {
    display: "block",
    fontSize: tokens.fontSizeBase300,
    lineHeight: "18px",
    fontWeight: tokens.fontWeightSemibold,
    overflowWrap: "anywhere",
  },
  holds: {
    display: "block",
    fontSize: tokens.fontSizeBase200,
    lineHeight: "16px",
    color: tokens.colorNeutralForeground3,
  },
  unusable: { color: tokens.colorStatusDangerForeground1 },
  role: { minWidth: 0, fontSize: tokens.fontSizeBase200 },
  guess: {
    display: "block",
    paddingLeft: "8px",
    fontSize: tokens.fontSizeBase100,
    lineHeight: "14px",
    color: tokens.colorNeutralForeground3,
  },
});

/** One column: name, what it holds, how much of it cannot be used, its values in a tiny picture, its role. */
export function ColumnRow({ column, setup }: ColumnInHand): ReactNode {
  const styles = useStyles();
  const joined = usePane().state.setup?.rows === "time";
  const unusable = unusableCells(column, setup).count;
  const [open, setOpen] = useState(false);
  const id = useId();
  return (
    <>
      <div className={styles.row}>
        <button
          type="button"
          className={styles.toggle}
          aria-expanded={open}
          aria-controls={id}
          onClick={() => setOpen(!open)}
        >
          <Turn className={mergeClasses(styles.turn, open && styles.open)} />
          <span>
            <span className={styles.name}>{column.name}</span>
            <span className={styles.holds}>{holdsInWords(column)}</span>
            {unusable > 0 && (
              <span className={mergeClasses(styles.holds, setup.role !== "unused" && styles.unusable)}>
                {unusable.toLocaleString("en-US")} unusable
              </span>
            )}
          </span>
        </button>
        <ColumnPicture column={column} joined={joined} />
        <RoleChoice setup={setup} />
      </div>
      <div id={id} hidden={!open}>
        {open && <ColumnDetails column={column} setup={setup} />}
      </div>
    </>
  );
}

const roles: readonly (readonly [Role, string])[] = [
  ["outcome", "outcome"],
  ["driver", "driver"],
  ["time", "time"],
  ["group", "group"],
  // In full it would be cut off.
  ["second group", "2nd group"],
  ["unused", "not used"],
];

function RoleChoice({ setup }: { readonly setup: ColumnSetup }): ReactNode {
  const styles = useStyles();
  const { dispatch } = usePane();
  const choose = (role: Role): void => dispatch({ kind: "role chosen", column: setup.column, role });
  return (
    <div>
      <Select
        size="small"
        className={styles.role}
        select={{ className: styles.role }}
        aria-label={`Role of ${setup.column}${setup.guessed ? " (a guess)" : ""}`}
        value={setup.role}
        onChange={(_, { value }) => choose(roles.find(([role]) => role === value)?.[0] ?? "unused")}
      >
        {roles.map(([role, words]) => (
          <option key={role} value={role}>
            {words}
          </option>
        ))}
      </Select>
      {setup.guessed && (
        <span className={styles.guess} aria-hidden="true">
          a guess
        </span>
      )}
    </div>
  );
}
