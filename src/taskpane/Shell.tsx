import { makeStyles, tokens } from "@fluentui/react-components";
import { type ReactNode, useRef } from "react";
import type { Section } from "../app/state.ts";
import { ActionBar } from "./ActionBar.tsx";
import { Announcer } from "./parts/Announcer.tsx";
import { FaultNotice } from "./parts/FaultNotice.tsx";
import { Tabs, tabId } from "./parts/Tabs.tsx";
import { SheetTools } from "./SheetTools.tsx";
import { AnswerSection } from "./answer/AnswerSection.tsx";
import { CompareSection } from "./compare/CompareSection.tsx";
import { DataSection } from "./data/DataSection.tsx";
import { EvidenceSection } from "./evidence/EvidenceSection.tsx";
import { HelpProvider } from "./help/HelpProvider.tsx";
import { HelpRoom } from "./help/HelpRoom.tsx";
import { useKeptFocus } from "./look/useKeptFocus.ts";
import { usePane } from "./paneContext.ts";
import { ReviewSection } from "./review/ReviewSection.tsx";

/** Below this height nothing may stand fixed, or zoomed pages would hide what has the focus. */
const tooLow = "@media (max-height: 280px)";

const useStyles = makeStyles({
  shell: { display: "flex", flexDirection: "column", height: "100vh", [tooLow]: { height: "auto" } },
  main: {
    flexGrow: 1,
    overflowY: "auto",
    overflowX: "hidden",
    padding: `${tokens.spacingVerticalL} ${tokens.spacingHorizontalL}`,
    scrollbarGutter: "stable",
    [tooLow]: { overflowY: "visible" },
  },
});

const sections: readonly (readonly [Section, string])[] = [
  ["data", "Data"],
  ["answer", "Answer"],
  ["evidence", "Evidence"],
  ["review", "Review"],
];

const nameOf = (section: Section): string => sections.find(([name]) => name === section)![1];

/** Tabs above, one section that scrolls, what can be done next below. */
export function Shell(): ReactNode {
  const styles = useStyles();
  const { state, dispatch } = usePane();
  const shell = useRef<HTMLDivElement>(null);
  useKeptFocus(shell, state.arrivals);
  const { section } = state;
  return (
    <HelpProvider section={section}>
      <div ref={shell} className={styles.shell}>
        <header>
          <Tabs
            label="Sections"
            tabs={sections}
            selected={section}
            panel="section"
            onSelect={(name) => dispatch({ kind: "shown", section: name })}
          />
        </header>
        <main className={styles.main} key={section}>
          <div role="tabpanel" id="section" aria-labelledby={tabId(section)}>
            <HelpRoom backTo={nameOf(section)}>
              <FaultNotice />
              {section === "data" && <DataSection />}
              {section === "answer" &&
                (state.comparison === null ? <AnswerSection /> : <CompareSection comparison={state.comparison} />)}
              {section === "evidence" && <EvidenceSection />}
              {section === "review" && <ReviewSection />}
              {(section === "data" || section === "answer") && <SheetTools />}
            </HelpRoom>
          </div>
        </main>
        <ActionBar />
        <Announcer said={state.said} />
      </div>
    </HelpProvider>
  );
}
