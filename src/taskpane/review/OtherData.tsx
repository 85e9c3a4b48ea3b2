import { type ReactNode, useEffect } from "react";
import type { Claim } from "../../core/review/claim.ts";
import { rangeOfLine } from "../../core/review/reviewWords.ts";
import { Disclosure } from "../parts/Disclosure.tsx";
import { usePane } from "../paneContext.ts";
import { PointingForm } from "./PointingForm.tsx";

/** Typed results do not say where they come from: what was taken for their data can be put right. */
export function OtherData({ claim }: { readonly claim: Claim }): ReactNode {
  if (claim.origin.kind !== "typed") return null;
  return (
    <Disclosure label="Other data are meant">
      <FormFor claim={claim} />
    </Disclosure>
  );
}

/** The form, with what was taken in its fields. */
function FormFor({ claim }: { readonly claim: Claim }): ReactNode {
  const { dispatch } = usePane();
  const { place, outcome, drivers } = claim;
  useEffect(() => {
    const pointing = { reported: place, outcome: rangeOfLine(outcome), drivers: drivers.map(rangeOfLine).join(", ") };
    dispatch({ kind: "pointing changed", pointing });
  }, [dispatch, place, outcome, drivers]);
  return <PointingForm />;
}
