import { mergeClasses, makeStyles, tokens } from "@fluentui/react-components";
import type { ReactNode } from "react";
import type { DriverAnswer } from "../../core/answer/answer.ts";

const useStyles = makeStyles({
  mark: { color: tokens.colorBrandForeground1, "@media (forced-colors: active)": { color: "CanvasText" } },
});

/** Firm stands square and full; what leans on the choice is an open, tilted square. Words say it beside. */
export function FirmnessMark({
  firmness,
  className,
}: {
  readonly firmness: DriverAnswer["firmness"];
  readonly className?: string;
}): ReactNode {
  const styles = useStyles();
  return (
    <span className={mergeClasses(styles.mark, className)} aria-hidden="true">
      <svg width="12" height="12" viewBox="0 0 12 12">
        {firmness.kind === "firm" ? (
          <rect x="2" y="2" width="8" height="8" fill="currentColor" />
        ) : (
          <rect
            x="2.5"
            y="2.5"
            width="7"
            height="7"
            fill="none"
            stroke="currentColor"
            strokeWidth="1.5"
            transform="rotate(45 6 6)"
          />
        )}
      </svg>
    </span>
  );
}
