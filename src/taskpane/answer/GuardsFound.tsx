import { Link, makeStyles } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { Answer } from "../../core/answer/answer.ts";
import { listInWords } from "../../core/answer/wording.ts";
import { guardsWith } from "../evidence/guardNames.ts";
import { useType } from "../look/type.ts";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({
  link: { minHeight: "24px", margin: "-4px 0", fontSize: "inherit" },
});

/** That the guards found something, beside the verdict: firm says nothing of what they look at. */
export function GuardsFound({ answer }: { readonly answer: Answer }): ReactNode {
  const styles = useStyles();
  const type = useType();
  const { dispatch } = usePane();
  const { found } = answer.guards;
  const [pressing, other] = [guardsWith(found, "look into it"), guardsWith(found, "worth knowing")];
  if (pressing.length + other.length === 0) return null;
  return (
    <p className={type.body}>
      {pressing.length > 0 && <>Before you rely on it, look into: {listInWords(pressing)}. </>}
      {other.length > 0 && <>Worth knowing: {listInWords(other)}. </>}
      <Link as="button" inline className={styles.link} onClick={() => dispatch({ kind: "shown", section: "evidence" })}>
        See the guards
      </Link>
    </p>
  );
}
