import { Link, makeStyles } from "@fluentui/react-components";
import type { ReactNode } from "react";
import { usePane } from "../paneContext.ts";

const useStyles = makeStyles({
  link: { display: "inline-flex", alignItems: "center", minHeight: "24px", minWidth: "24px", fontSize: "inherit" },
});

/** An address that selects its cells in the sheet; places that have none stay plain text. */
export function CellLink({
  address,
  children,
}: {
  readonly address: string;
  readonly children?: ReactNode;
}): ReactNode {
  const styles = useStyles();
  const { commands } = usePane();
  const words = children ?? address;
  if (!address.includes("!")) return <span>{words}</span>;
  return (
    <Link as="button" inline className={styles.link} title={`Go to ${address}`} onClick={() => commands.goTo(address)}>
      {words}
    </Link>
  );
}
