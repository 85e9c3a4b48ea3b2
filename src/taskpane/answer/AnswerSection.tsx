import type { ReactNode } from "react";
import { SectionTitle } from "../parts/SectionTitle.tsx";
import { useType } from "../look/type.ts";
import { usePane } from "../paneContext.ts";
import { HelpHead } from "../help/HelpHead.tsx";
import { AskMore } from "./AskMore.tsx";
import { AskedFigures } from "./AskedFigures.tsx";
import { Choice } from "./Choice.tsx";
import { DriverList } from "./DriverList.tsx";
import { Memo } from "./Memo.tsx";
import { NoAnswer } from "./NoAnswer.tsx";
import { OutdatedNotice } from "./OutdatedNotice.tsx";
import { RowsUsed } from "./RowsUsed.tsx";
import { Verdict } from "./Verdict.tsx";
import { WhichErrors } from "./WhichErrors.tsx";

/** What holds, how firmly, and why: the verdict first. */
export function AnswerSection(): ReactNode {
  const type = useType();
  const { answered } = usePane().state;
  if (answered === null) return <NoAnswer section="Answer" />;
  const { answer } = answered;
  return (
    <>
      <SectionTitle>{answer.title}</SectionTitle>
      <OutdatedNotice />
      <Verdict answer={answer} />
      <HelpHead about="four cases">Which standard errors</HelpHead>
      <WhichErrors answer={answer} />
      <Choice />
      <HelpHead about="three kinds" asks="Why three kinds?">
        Drivers
      </HelpHead>
      <DriverList answer={answer} />
      <AskedFigures answer={answer} />
      <AskMore />
      <h2 className={type.head}>Rows</h2>
      <RowsUsed answer={answer} />
      <Memo />
      <p className={type.footnote}>{caution}</p>
    </>
  );
}

const caution =
  "A statistical check, not financial, legal or audit advice. Have a qualified person look before money or a filing depends on it.";
