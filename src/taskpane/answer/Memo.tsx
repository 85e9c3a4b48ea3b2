import { type ReactNode, useEffect } from "react";
import { useType } from "../look/type.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { TextToCopy } from "../parts/TextToCopy.tsx";
import { usePane } from "../paneContext.ts";

/** The answer as plain text, to be copied into a memo. */
export const Memo = (): ReactNode => (
  <Disclosure label="Copy as text for a memo">
    <MemoText />
  </Disclosure>
);

const linesInView = 10;

function MemoText(): ReactNode {
  const type = useType();
  const { state, commands } = usePane();
  const memo = state.answered?.memo ?? null;
  // Made when it is asked for: the fingerprint goes over all the data.
  useEffect(() => {
    if (memo === null) commands.makeMemo();
  }, [memo, commands]);
  if (memo === null) return <p className={type.remark}>Putting the answer into words.</p>;
  return (
    <>
      {(state.answered?.outdated ?? null) !== null && (
        <p className={type.remark}>This tells of the answer as it was before the change: answer again first.</p>
      )}
      <TextToCopy label="The answer as text" text={memo} rows={linesInView} />
    </>
  );
}
