import { Checkbox } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { useType } from "../look/type.ts";
import { counted } from "../../core/problem/spots.ts";
import { usePane } from "../paneContext.ts";

/** Whether rows that the sheet does not show are used: asked where there are some, or where they were left out before. */
export function HiddenRows(): ReactNode {
  const type = useType();
  const { state, dispatch } = usePane();
  const { data, setup } = state;
  const count = data?.source.hidden?.rows.length ?? 0;
  if (setup === null || (count === 0 && !setup.visibleOnly)) return null;
  return (
    <>
      <Checkbox
        label={`Visible rows only (${count === 0 ? "no row is hidden now" : `${counted(count, "row")} hidden or filtered away`})`}
        checked={setup.visibleOnly}
        onChange={(_, { checked }) => dispatch({ kind: "setup changed", change: { visibleOnly: checked === true } })}
      />
      <p className={type.remark}>
        {setup.visibleOnly
          ? "Hidden rows are left out as if they were not there. Functions in a sheet cannot see what is hidden, so such an answer is written as values alone."
          : "Hidden rows are used like all others."}
      </p>
    </>
  );
}
