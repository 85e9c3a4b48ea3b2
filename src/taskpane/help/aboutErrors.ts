import type { HelpPage } from "./helpPage.ts";

export const threeKinds: HelpPage = {
  title: "Why three kinds of standard errors",
  parts: [
    "A coefficient is an estimate: other months or other shops would have given a slightly different one. The standard error says by how much it would typically differ. The ratio, the p-value and the interval all rest on it, so that a wrong standard error makes a wrong conclusion even where the coefficient is right.",
    "The coefficient is the same under every kind. The kinds differ in what they take for granted about the errors, that is, about what the drivers leave unexplained.",
    {
      terms: [
        [
          "Classical",
          "Right where the errors spread evenly and do not follow on from row to row. This is the kind that a spreadsheet's own regression prints.",
        ],
        [
          "White",
          "Holds up where the spread is uneven, for instance where large shops vary more than small ones. It still takes rows not to follow on.",
        ],
        [
          "Newey-West",
          "Holds up where the spread is uneven and where errors follow on from one period to the next, as they often do through time. It needs rows that run through time.",
        ],
        ["Grouped", "Takes the place of Newey-West where rows are in groups: rows of one group may share anything."],
      ],
    },
    "Why not always the most cautious kind? Where nothing is wrong, the classical kind finds more. In simulations with 20 rows it found a real effect 78 times in 100 where White's found it 70 times; from 80 rows on the two were within 2 of each other. And a kind that holds up in large samples can itself be off in small ones.",
    "All kinds are always shown side by side. The one in force is marked with a full dot.",
  ],
};

export const fourCases: HelpPage = {
  title: "Which of the four cases",
  parts: [
    "Two questions about the errors decide which standard errors count.",
    {
      terms: [
        [
          "Is the spread even?",
          "Two tests are asked: Koenker's form of the Breusch-Pagan test, and White's test. The spread is called uneven if either says so.",
        ],
        [
          "Do errors follow on?",
          "The test of Breusch and Godfrey is asked, and only where rows run through time: the order of separate cases means nothing.",
        ],
      ],
    },
    "Even and not following on: classical. Uneven only: White. Following on, even or not: Newey-West. For rows in groups the tests are shown but do not choose: the errors by group count.",
    {
      terms: [
        [
          "Careful",
          "The policy you start with. The tests are held to 10 %, in the form that keeps its level with few rows, because a missed problem costs more than a needless precaution.",
        ],
        ["Textbook", "Tests in their large-sample form, held to 5 %, as handbooks teach it."],
        ["Always robust", "White or Newey-West whatever the tests say; the tests are shown and not asked."],
      ],
    },
    "You can also fix a kind by hand. The report then says so, with your reason, and says what the tests would have called for.",
  ],
};

export const referenceDistribution: HelpPage = {
  title: "What the reference distribution does",
  parts: [
    "The ratio is the coefficient, less the value it is tested against, divided by its standard error. If the driver had no effect, ratios would still not be exactly zero: they would scatter. The reference distribution says how they would scatter.",
    "The p-value is the share of that scatter that lies at least as far out as the ratio found. A small one says: this would seldom come up if there were no effect. It is not the chance that there is no effect, and it says nothing about how large or useful an effect is.",
    {
      terms: [
        [
          "Normal",
          "The bell curve, right in large samples. Ratios beyond 1.96 on either side come up 5 % of the time.",
        ],
        [
          "t",
          "A bell curve with wider tails, because the spread of the errors is itself estimated. With 10 rows more than coefficients the 5 % limit is 2.23; with 100 it is 1.98.",
        ],
        [
          "Fixed-b",
          "For Newey-West with many lags, whose standard errors are themselves uncertain (Kiefer and Vogelsang 2005). b is the share of the rows that the lags reach over; at b = 0.1 the 5 % limit is 2.26, and larger still with few rows.",
        ],
      ],
    },
    "Tests of several things at once use chi-square or F in the same way. Where the large-sample figure would differ, it stands beside the one in force: the line “with the normal”.",
  ],
};

export const groups: HelpPage = {
  title: "Rows in groups",
  parts: [
    "Rows of one shop, customer or region often share something that the drivers do not explain. A hundred rows from ten shops then tell less than a hundred rows from a hundred shops, and the usual standard errors are too small.",
    "Standard errors by group let the errors of one group be uneven and related in any way. They take groups to be unrelated to one another, and they need many of them: with fewer than about 40 they tend to be too small, and the pane says so. What counts is the number of groups, not of rows.",
    {
      terms: [
        ["CR0", "As it comes, without a correction: too small with few groups."],
        ["CR1", "The usual correction for the number of groups and rows. You start with this one."],
        [
          "CR2",
          "Corrects each group by itself, and comes with degrees of freedom of its own for each coefficient. The better choice with few groups or groups of very different size.",
        ],
        ["Two groupings", "Rows can belong together in two ways at once, such as by shop and by month."],
      ],
    },
  ],
};
