import type { Analyst, Inquirer, Reviewer } from "../app/analyst.ts";

type Computing = Analyst & Inquirer & Reviewer;

/**
 * For browsers where a worker cannot start. All that computes is then loaded for the page itself, when it is first asked
 * for: the worker has its own, and few pages ever need a second one.
 */
export const lateComputing: Computing = {
  analyse: async (question, errand) => (await load()).analyse(question, errand),
  inquire: async (question, inquiry, errand) => (await load()).inquire(question, inquiry, errand),
  listClaims: async (book, asked, errand) => (await load()).listClaims(book, asked, errand),
  review: async (claim, errand) => (await load()).review(claim, errand),
};

async function load(): Promise<Computing> {
  const [{ inlineAnalyst }, { inlineReviewer }] = await Promise.all([
    import(/* webpackChunkName: "inline" */ "./inlineAnalyst.ts"),
    import(/* webpackChunkName: "inline" */ "./inlineReviewer.ts"),
  ]);
  return { ...inlineAnalyst, ...inlineReviewer };
}
