import type { HelpPage } from "./helpPage.ts";

export const reviews: HelpPage = {
  title: "What a review can and cannot show",
  parts: [
    "A review takes the cells that a regression names, fits it again, and holds every reported number against the one it finds, to the digits shown. Where they differ it tries small changes of the data and the model, one at a time and then in pairs: rows left off at an end, a heading or a total taken in, empty cells taken as zero, columns shifted against each other, another order of drivers, no constant, a logarithm, a factor of ten, hidden rows.",
    "A change is named only where every reported number then comes out. Several changes can do that when few digits were reported; all of them are named, since the digits cannot tell them apart.",
    {
      terms: [
        ["Changes the conclusion", "What someone was told of a driver does not hold when the work is done again."],
        ["Changes a number", "A figure is not what its cells give, or rests on rows or errors that it should not."],
        ["Worth knowing", "Nothing is wrong with the figures as they are, but it may go wrong or mislead."],
      ],
    },
    "What a review finds is what reproduces the numbers. It does not show how the work was really done, why, or that anything was meant: someone else's honest slip and a deliberate omission leave the same figures. Ask the author before you say more than the figures do.",
    "It can only read what the workbook holds. Figures typed in from elsewhere, data that were changed since, and formulas that find their range while they are calculated leave it without a trace; it then says what it could not read. That nothing was found is no assurance that nothing is there.",
    "Whether the drivers are the right ones, and whether they cause anything, is beyond every check of arithmetic.",
  ],
};
