import type { HelpPage } from "./helpPage.ts";

export const firm: HelpPage = {
  title: "What firm means",
  parts: [
    "Someone else could have chosen other standard errors. Footing therefore works out every driver under all choices that are in common use: classical, White in five versions, Newey-West from no lags up to more than twice as many as in force, each against every reference distribution that goes with it.",
    {
      terms: [
        [
          "Firm",
          "All of them come to the same conclusion as the one in force: shown under all, or not shown under all.",
        ],
        [
          "Leans on the choice",
          "Some say otherwise. The pane names them, and the p-value that is farthest away. Say so when you report the result.",
        ],
      ],
    },
    "“Not shown” can be firm too: then no choice of standard errors would have found an effect.",
    "Firm is about the choice of standard errors alone. It does not say that the right drivers are in, that the relation is a straight line, or that one thing causes the other. Under Figures stands one more check: the coefficient without the one row that it hangs on most.",
  ],
};

export const testsMiss: HelpPage = {
  title: "What the tests can miss",
  parts: [
    "A test that finds nothing has not shown that nothing is there. With few rows it often misses a real problem. That is why “even spread” in a small sample is called not contradicted, rather than shown, and why the robust figures stand beside the classical ones: where they tell a different story, trust them.",
    "How much is left over? In simulations of the careful policy as a whole, a slope that was truly zero was called real at 5 %:",
    {
      terms: [
        ["20 separate rows, spread that grows with a driver", "7 times in 100 instead of 5."],
        ["160 periods, drivers and errors that follow on strongly", "8 to 9 times in 100."],
        ["40 periods, drivers that follow on strongly, errors a little", "10 times in 100."],
      ],
    },
    "So where errors follow on, take a p-value between 0.01 and 0.05 as undecided in a small sample.",
    "Some tests see too much: those that look for breaks, missing curves and runs of large errors take errors not to follow on. Where they do, these tests often find what is not there, and the pane says so beside them.",
    "No test here can see a driver that is missing, a figure that was typed wrongly, rows that were chosen because they fit, or which of two things moves the other. And with very many rows a test can reject a departure that is too small to matter: look at the picture as well as at the p-value.",
  ],
};

export const leftOutRows: HelpPage = {
  title: "What left-out rows are",
  parts: [
    "A row can be used only if every column that plays a part has a value in it. A row is left out where one of these cells is empty or holds a usual mark for a missing value, such as n/a or a lone dash, and where a lag or a change needs an earlier period that is not there. Hidden rows are left out only if you ask for it.",
    "Every row that is left out is listed with the cell and the reason. An empty cell is never taken as zero. Any other text among numbers is not skipped: it has to be mended, or the column read as categories.",
    "Through time, a row that is left out keeps its place: the months before and after it are not treated as neighbours.",
    "Ask why the rows are missing. If it has to do with the outcome, such as shops that closed because takings fell, the answer holds for the rows that are left and not for all.",
  ],
};

export const liveAndKept: HelpPage = {
  title: "Live and kept sheets",
  parts: [
    "Both look alike. They differ in what the figures are.",
    {
      terms: [
        [
          "Live",
          "The figures are worksheet functions over your cells. They move when the cells move. Who opens the workbook needs Footing; without it the last values stay until the sheet is recalculated, and then #NAME? stands in their place.",
        ],
        [
          "Kept",
          "The figures are plain values as of now. They need no add-in, and nothing changes them. When a source cell changes, the pane says that the sheet is out of date.",
        ],
      ],
    },
    "Pictures, guards and the list of rows left out are as of the time when the sheet was made, in both kinds.",
    "A kept sheet is the one to send or file. A live sheet can be turned into a kept one later: show it, and choose “Turn into a kept sheet” under “Functions in the sheet in front”.",
    "Either kind carries the fingerprint of the data it was made from, so that a second person can see whether the same data give the same sheet.",
  ],
};
