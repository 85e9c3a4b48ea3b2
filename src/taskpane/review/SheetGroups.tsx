import { Checkbox, makeStyles, mergeClasses, tokens } from "@fluentui/react-components";
import { type ReactNode, useId } from "react";
import { type SheetGroup, groupsOf, shownWords } from "../../app/review/listing.ts";
import type { ReviewInHand } from "../../app/review/reviewState.ts";
import { counted } from "../../core/problem/spots.ts";
import { rowButton } from "../look/rowButton.ts";
import { useType } from "../look/type.ts";
import { Turn } from "../parts/Disclosure.tsx";
import { usePane } from "../paneContext.ts";
import { RankMark } from "./RankMark.tsx";
import { RegressionEntries } from "./RegressionEntries.tsx";

const useStyles = makeStyles({
  group: { borderTop: `1px solid ${tokens.colorNeutralStroke2}` },
  head: { margin: 0, font: "inherit" },
  button: { ...rowButton, gridTemplateColumns: "12px 16px minmax(0, 1fr)", minHeight: "32px" },
  turn: { marginTop: "3px" },
  open: { transform: "rotate(90deg)" },
  mark: { paddingTop: "2px" },
  sheet: { fontSize: tokens.fontSizeBase300, lineHeight: "19px", fontWeight: tokens.fontWeightSemibold },
  words: { display: "block", color: tokens.colorNeutralForeground3 },
  entries: { paddingLeft: tokens.spacingHorizontalL },
});

/** A long list of regressions, sheet by sheet, each sheet folded under its name and counts; narrowed to what was found. */
export function SheetGroups({ review }: { readonly review: ReviewInHand }): ReactNode {
  const type = useType();
  const { dispatch } = usePane();
  const { regressions, listing } = review;
  const groups = groupsOf(review);
  const isAnyReviewed = regressions.some((one) => one.review !== null);
  return (
    <>
      {isAnyReviewed && (
        <Checkbox
          label="Only those with findings"
          checked={listing.onlyFindings}
          onChange={(_, { checked }) =>
            dispatch({ kind: "regressions listed", listing: { onlyFindings: checked === true } })
          }
        />
      )}
      {listing.onlyFindings && <p className={type.remark}>{shownWords(review)}</p>}
      {groups.map((group) => (
        <GroupOfSheet key={group.sheet} group={group} open={listing.open} />
      ))}
    </>
  );
}

interface GroupOfSheetProps {
  readonly group: SheetGroup;
  readonly open: readonly string[];
}

function GroupOfSheet({ group, open }: GroupOfSheetProps): ReactNode {
  const styles = useStyles();
  const { dispatch } = usePane();
  const id = useId();
  const { sheet, count, words, gravest, isReviewed, entries } = group;
  const isOpen = open.includes(sheet);
  const turned = isOpen ? open.filter((one) => one !== sheet) : [...open, sheet];
  return (
    <div className={styles.group}>
      <h2 className={styles.head}>
        <button
          type="button"
          className={styles.button}
          aria-expanded={isOpen}
          aria-controls={id}
          onClick={() => dispatch({ kind: "regressions listed", listing: { open: turned } })}
        >
          <Turn className={mergeClasses(styles.turn, isOpen && styles.open)} />
          <span className={styles.mark}>{isReviewed && <RankMark rank={gravest} />}</span>
          <span>
            <span className={styles.sheet}>{sheet}</span>{" "}
            <span className={styles.words}>
              {counted(count, "regression")}: {words}
            </span>
          </span>
        </button>
      </h2>
      <div id={id} hidden={!isOpen} className={styles.entries}>
        {isOpen && <RegressionEntries entries={entries} />}
      </div>
    </div>
  );
}
