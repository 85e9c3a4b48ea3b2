import { Component, type ReactNode } from "react";
import { BugReport } from "./parts/BugReport.tsx";
import { detailsOf } from "../app/faultDetails.ts";

interface Caught {
  readonly details: string | null;
}

/** Shows a fault of ours that stops the pane from being drawn; the library takes no function for this. */
export class FaultBoundary extends Component<{ readonly children: ReactNode }, Caught> {
  override state: Caught = { details: null };

  static getDerivedStateFromError(fault: unknown): Caught {
    return { details: detailsOf(fault) };
  }

  override render(): ReactNode {
    const { details } = this.state;
    return details === null ? this.props.children : <BugReport details={details} />;
  }
}
