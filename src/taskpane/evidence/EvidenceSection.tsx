import type { ReactNode } from "react";
import { OutdatedNotice } from "../answer/OutdatedNotice.tsx";
import { NoAnswer } from "../answer/NoAnswer.tsx";
import { useType } from "../look/type.ts";
import { SectionTitle } from "../parts/SectionTitle.tsx";
import { usePane } from "../paneContext.ts";
import { Residuals } from "./Residuals.tsx";
import { TestList } from "./TestList.tsx";

/** What the answer rests on: every test with its reading, and the residuals to look at. */
export function EvidenceSection(): ReactNode {
  const type = useType();
  const { answered } = usePane().state;
  if (answered === null) return <NoAnswer section="Evidence" />;
  const { answer } = answered;
  return (
    <>
      <SectionTitle>Evidence on {answer.outcome}</SectionTitle>
      <OutdatedNotice />
      <TestList answer={answer} />
      <h2 className={type.head}>Residuals</h2>
      <Residuals answer={answer} address={answered.address} />
    </>
  );
}
