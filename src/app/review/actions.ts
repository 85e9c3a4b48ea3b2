import type { ClaimReview } from "../../core/review/claimReview.ts";
import type { Asked, BookClaims } from "../../core/review/claimsOf.ts";
import type { DataInHand } from "../dataInHand.ts";
import type { Setup } from "../setup.ts";
import type { Listing } from "./reviewState.ts";
import type { Pointing } from "./reviewState.ts";

/** What can happen to a review. */
export type ReviewAction =
  | { readonly kind: "regressions found"; readonly asked: Asked; readonly found: BookClaims }
  | { readonly kind: "regression reviewed"; readonly index: number; readonly review: ClaimReview }
  | { readonly kind: "review finished" }
  | { readonly kind: "reviewed cell changed"; readonly cell: string }
  /** Null shows the list. */
  | { readonly kind: "regression opened"; readonly index: number | null }
  | { readonly kind: "regressions listed"; readonly listing: Partial<Listing> }
  | { readonly kind: "pointing changed"; readonly pointing: Partial<Pointing> }
  /** The selected cells go into a field. */
  | { readonly kind: "cells pointed at"; readonly field: keyof Pointing; readonly address: string }
  | { readonly kind: "review written"; readonly sheet: string }
  /** The data of a regression are in hand, for an answer of one's own. */
  | { readonly kind: "regression taken over"; readonly data: DataInHand; readonly setup: Setup };
