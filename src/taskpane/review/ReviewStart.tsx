import { type ReactNode } from "react";
import { useType } from "../look/type.ts";
import { SectionTitle } from "../parts/SectionTitle.tsx";
import { ReviewChoices } from "./ReviewChoices.tsx";
import { ReviewLimits } from "./ReviewLimits.tsx";

/** What a review is, and the ways to begin one. */
export function ReviewStart(): ReactNode {
  const type = useType();
  return (
    <>
      <SectionTitle>Check a regression that someone else built</SectionTitle>
      <p className={type.body}>
        Footing fits it again to the cells it names, explains what differs, says which standard errors were taken and
        whether the evidence allows them, and what the conclusions should have been.
      </p>
      <ReviewChoices />
      <ReviewLimits />
    </>
  );
}
