import type { ReactNode } from "react";
import type { BookReview } from "../../core/review/claimReview.ts";
import { useType } from "../look/type.ts";
import { PlacesSaid } from "./PlacesSaid.tsx";

const mostListed = 20;

/** What looks like a regression and could not be read, each with the reason. */
export function UnreadList({ unread }: Pick<BookReview, "unread">): ReactNode {
  const type = useType();
  if (unread.length === 0) return null;
  const more = unread.length - mostListed;
  return (
    <>
      <h2 className={type.head}>Could not be read</h2>
      <PlacesSaid places={unread.slice(0, mostListed).map(({ cell, why }) => ({ address: cell, words: why }))} />
      {more > 0 && <p className={type.remark}>and {more} more</p>}
    </>
  );
}
