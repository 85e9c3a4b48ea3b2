/** A page of help: one concept, for someone who took one statistics course long ago. */
export interface HelpPage {
  /** The question it answers, as its title. */
  readonly title: string;
  readonly parts: readonly HelpPart[];
}

/** A paragraph, or terms with what each means. */
export type HelpPart = string | { readonly terms: readonly (readonly [term: string, meaning: string])[] };
