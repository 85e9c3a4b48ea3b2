import type { SheetKind } from "../sheet/answerSheet.ts";
import type { LostColumn } from "./carrying.ts";
import type { DataInHand } from "./dataInHand.ts";
import type { Progress } from "./errand.ts";
import type { DataPlace } from "./host.ts";
import type { ReviewAction } from "./review/actions.ts";
import type { ColumnDetails, Role, Setup } from "./setup.ts";
import type { Answered, Busy, Fault, Section } from "./state.ts";
import type { StoredAction } from "./stored/actions.ts";

/** Everything that can happen to the pane. */
export type Action =
  | StoredAction
  | ReviewAction
  | { readonly kind: "shown"; readonly section: Section }
  | { readonly kind: "places found"; readonly places: readonly DataPlace[] }
  | { readonly kind: "started"; readonly on: Busy["with"] }
  | { readonly kind: "progressed"; readonly progress: Progress }
  | { readonly kind: "cancelled" }
  | { readonly kind: "failed"; readonly fault: Fault }
  | { readonly kind: "dismissed" }
  | {
      readonly kind: "read";
      readonly data: DataInHand;
      readonly setup: Setup;
      readonly lost: readonly LostColumn[];
      readonly opened: string | null;
    }
  /** Another column takes the place of a lost one, or none does. */
  | { readonly kind: "lost settled"; readonly lost: LostColumn; readonly by: string | null }
  | { readonly kind: "role chosen"; readonly column: string; readonly role: Role }
  | { readonly kind: "column changed"; readonly column: string; readonly details: ColumnDetails }
  | {
      readonly kind: "setup changed";
      readonly change: Partial<Pick<Setup, "rows" | "constant" | "visibleOnly" | "calendar" | "options">>;
    }
  | { readonly kind: "answered"; readonly answered: Omit<Answered, "outdated" | "memo"> }
  | { readonly kind: "memo made"; readonly text: string }
  | { readonly kind: "written"; readonly sheet: string; readonly as: SheetKind }
  | { readonly kind: "recalculated"; readonly sheet: string }
  | { readonly kind: "kept"; readonly sheet: string }
  | { readonly kind: "cell changed"; readonly cell: string }
  | { readonly kind: "said"; readonly text: string };
