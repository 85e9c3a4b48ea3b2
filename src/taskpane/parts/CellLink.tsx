import { Link, makeStyles, mergeClasses } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({
  // Its height counts as a target, but not in the line that it stands in.
  inText: { margin: "-4px 0" },
  link: { display: "inline-flex", alignItems: "center", minHeight: "24px", minWidth: "24px", fontSize: "inherit" },
});

interface CellLinkProps {
  readonly address: string;
  readonly children?: ReactNode;
  readonly className?: string;
}

/** The same within a running text, whose lines stay as they are. */
export const CellInText = (props: Omit<CellLinkProps, "className">): ReactNode => (
  <CellLink {...props} className={useStyles().inText} />
);

/** An address that selects its cells in the sheet; places that have none stay plain text. */
export function CellLink({ address, children, className }: CellLinkProps): ReactNode {
  const styles = useStyles();
  const { commands } = usePane();
  const words = children ?? address;
  if (!address.includes("!")) return <span>{words}</span>;
  return (
    <Link
      as="button"
      inline
      className={mergeClasses(styles.link, className)}
      title={`Go to ${address}`}
      onClick={() => commands.goTo(address)}
    >
      {words}
    </Link>
  );
}
