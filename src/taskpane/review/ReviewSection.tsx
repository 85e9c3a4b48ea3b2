import type { ReactNode } from "react";
import { usePane } from "../paneContext.ts";
import { NothingFound } from "./NothingFound.tsx";
import { RegressionDetails } from "./RegressionDetails.tsx";
import { RegressionList } from "./RegressionList.tsx";
import { ReviewStart } from "./ReviewStart.tsx";

/** Checking regressions that someone else built: finding them, then what is said of each. */
export function ReviewSection(): ReactNode {
  const { review } = usePane().state;
  if (review === null) return <ReviewStart />;
  if (review.regressions.length === 0) return <NothingFound review={review} />;
  const open = review.open === null ? undefined : review.regressions[review.open];
  return open === undefined ? (
    <RegressionList review={review} />
  ) : (
    <RegressionDetails review={review} regression={open} />
  );
}
