import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { NoAnswer } from "../answer/NoAnswer.tsx";
import { OutdatedNotice } from "../answer/OutdatedNotice.tsx";
import { useType } from "../look/type.ts";
import { SectionTitle } from "../parts/SectionTitle.tsx";
import { usePane } from "../paneContext.ts";
import { GuardList } from "./GuardList.tsx";
import { KeptOutTests } from "./KeptOutTests.tsx";
import { Residuals } from "./Residuals.tsx";
import { TestList } from "./TestList.tsx";
import { applies, groupTests } from "./testGroups.ts";

/** From where on a test says that it found something. */
const levelInWords = ({ decision }: Answer): string =>
  `Tests are held to ${Number((100 * decision.testLevel).toPrecision(6))}\u00a0%: something counts as found where p is below ${decision.testLevel}. What is not found is not shown to be absent.`;

/** What the answer rests on: the tests that decided, what to know beside them, the residuals, every other test. */
export function EvidenceSection(): ReactNode {
  const type = useType();
  const { answered } = usePane().state;
  if (answered === null) return <NoAnswer section="Evidence" />;
  const { answer, address } = answered;
  const groups = groupTests(answer);
  const deciding = groups.filter(({ decided }) => decided);
  const further = groups.filter((group) => !group.decided && applies(group));
  const silent = groups.filter((group) => !applies(group));
  return (
    <>
      <SectionTitle>Evidence on {answer.outcome}</SectionTitle>
      <OutdatedNotice />
      <p className={type.remark}>{levelInWords(answer)}</p>
      {deciding.length > 0 && (
        <>
          <h2 className={type.head}>Tests that decided</h2>
          <TestList groups={deciding} answer={answer} />
        </>
      )}
      <h2 className={type.head}>Guards</h2>
      <GuardList guards={answer.guards} />
      <h2 className={type.head}>Residuals</h2>
      <Residuals answer={answer} address={address} />
      <h2 className={type.head}>{deciding.length > 0 ? "Further tests" : "Tests"}</h2>
      <TestList groups={further} answer={answer} />
      <KeptOutTests groups={silent} />
    </>
  );
}
