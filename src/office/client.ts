/** Excel's entry points: those of the page by default; the terminal and the tests bring their own. */
export interface ExcelClient {
  readonly run: typeof Excel.run;
  readonly isSetSupported: (set: string, version: string) => boolean;
}

/** What the page's script has put there; asked for at each use, since the script may still be loading. */
export const pageClient: ExcelClient = {
  run: ((...run: Parameters<typeof Excel.run>) => Excel.run(...run)) as typeof Excel.run,
  isSetSupported: (set, version) => Office.context.requirements.isSetSupported(set, version),
};
