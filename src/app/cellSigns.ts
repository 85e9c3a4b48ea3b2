/** What a cell may show in the place of a function's value, and what to do about it. */
export const cellSigns: readonly (readonly [sign: string, meaning: string])[] = [
  [
    "#NAME?",
    "The add-in is not loaded here. Open Footing once in this workbook, then recalculate; who has no add-in needs a kept sheet.",
  ],
  [
    "#BUSY!",
    "The function is still at work. The value comes by itself; if it stays away, recalculate this sheet's functions.",
  ],
  [
    "#SPILL!",
    "Something stands in the cells that the result needs. Empty the cells below and to the right of the formula, or move it.",
  ],
];
