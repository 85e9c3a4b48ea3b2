/** What a worksheet function takes, gives and means: metadata, help and the pane's list are all made from this table. */
export interface FunctionSpec {
  /** Never changes once published: workbooks hold it. */
  readonly id: string;
  readonly description: string;
  readonly parameters: readonly ParameterSpec[];
  /** What stands in the cells, in a sentence. */
  readonly gives: string;
}

export interface ParameterSpec {
  readonly name: string;
  readonly description: string;
  readonly shape: "cells" | "one value";
  readonly optional: boolean;
}

const outcome: ParameterSpec = {
  name: "outcome",
  description: "The column to be explained, with or without its heading.",
  shape: "cells",
  optional: false,
};

const drivers: ParameterSpec = {
  name: "drivers",
  description: "The columns that may explain it, as tall as the outcome, headings alike.",
  shape: "cells",
  optional: false,
};

const settings: ParameterSpec = {
  name: "settings",
  description:
    'Two columns of names and values, or a text such as "rows: time; lags: 4". FOOTING.SETTINGS() lists them.',
  shape: "cells",
  optional: true,
};

const key: ParameterSpec = {
  name: "key",
  description: "The time or the group of each row; a second column gives the time within groups.",
  shape: "cells",
  optional: true,
};

const kind: ParameterSpec = {
  name: "kind",
  description: 'Standard errors: "by tests" (also when left out), "classical", "white", "newey-west" or "grouped".',
  shape: "one value",
  optional: true,
};

const optional = (name: string, description: string): ParameterSpec => ({
  name,
  description,
  shape: "one value",
  optional: true,
});

const overData = (...between: readonly ParameterSpec[]): readonly ParameterSpec[] => [
  outcome,
  drivers,
  ...between,
  settings,
  key,
];

export const functionTable = [
  {
    id: "ANSWER",
    description: "The whole answer of a regression as a table, with the standard errors that the evidence calls for.",
    parameters: overData(),
    gives:
      "A heading row, then a row a driver: coefficient, the three standard errors, the one in force, ratio, p-value, interval and conclusion.",
  },
  {
    id: "VERDICT",
    description: "What may be said of the drivers, in plain words.",
    parameters: overData(optional("driver", "One driver, by its heading or number; all when left out.")),
    gives: "One sentence a row; the sentence about the driver where one is named.",
  },
  {
    id: "CHOICE",
    description: "The kind of standard errors in force and what the ratios are compared with.",
    parameters: overData(),
    gives: "One text.",
  },
  {
    id: "EVIDENCE",
    description: "The tests behind the choice of standard errors.",
    parameters: overData(
      optional("test", 'One test, such as "koenker", "white" or "breusch-godfrey"; all when left out.'),
    ),
    gives:
      "A table of all tests with their readings; statistic, degrees of freedom and p-value where one is named, a row an order where it has orders.",
  },
  {
    id: "COEFFICIENTS",
    description: "The coefficients of a regression, the constant first.",
    parameters: overData(),
    gives: "One column, in the order of ANSWER.",
  },
  {
    id: "ERRORS",
    description: "The standard errors of the coefficients, by tests or of one kind.",
    parameters: overData(kind),
    gives: "One column, in the order of ANSWER.",
  },
  {
    id: "PVALUES",
    description: "The p-values of the coefficients, two-sided.",
    parameters: overData(kind, {
      name: "against",
      description: "The value each coefficient is tested against: one for all, or one a coefficient; 0 when left out.",
      shape: "cells",
      optional: true,
    }),
    gives: "One column, in the order of ANSWER.",
  },
  {
    id: "INTERVALS",
    description:
      "The intervals of the coefficients at one less the level (95 % unless the setting level says otherwise).",
    parameters: overData(kind),
    gives: "Two columns, low and high, in the order of ANSWER.",
  },
  {
    id: "COVARIANCE",
    description: "The covariance of the coefficients.",
    parameters: overData(kind),
    gives: "A square, rows and columns in the order of ANSWER.",
  },
  {
    id: "JOINT",
    description: "A test that linear combinations of the coefficients have given values, all at once.",
    parameters: [
      outcome,
      drivers,
      {
        name: "weights",
        description:
          "A row for each combination, one weight a coefficient in the order of ANSWER; the constant's may be left out.",
        shape: "cells",
        optional: false,
      },
      {
        name: "equals",
        description: "The value of each combination, or one for all; 0 when left out.",
        shape: "cells",
        optional: true,
      },
      kind,
      settings,
      key,
    ],
    gives: "Statistic, degrees of freedom and p-value, side by side.",
  },
  {
    id: "PREDICT",
    description:
      "What the regression expects of new rows, with the interval of the mean or, by the setting predict for, of a single row.",
    parameters: [
      outcome,
      drivers,
      {
        name: "rows",
        description: "New rows, one column a driver in the same order, with or without headings.",
        shape: "cells",
        optional: false,
      },
      kind,
      settings,
      key,
    ],
    gives: "Value, low and high for each row, blank where a driver is missing.",
  },
  {
    id: "RESIDUALS",
    description: "How far each row lies from what the regression expects of it.",
    parameters: overData(),
    gives: "One column beside the data, as tall as they are, blank where a row was left out.",
  },
  {
    id: "FITTED",
    description: "What the regression expects of each row.",
    parameters: overData(),
    gives: "One column beside the data, as tall as they are, blank where a row was left out.",
  },
  {
    id: "LAGS",
    description: "The number of lags that a rule gives for a number of rows.",
    parameters: [
      { name: "rows", description: "How many rows the regression uses.", shape: "one value", optional: false },
      optional("rule", 'The rule: "careful" (also when left out), "thumb" or "cube root".'),
    ],
    gives: "One number.",
  },
  {
    id: "SETTINGS",
    description: "Every setting with its values, what holds when it is left out, and what it does.",
    parameters: [],
    gives: "A table with headings: the manual inside the sheet.",
  },
] as const satisfies readonly FunctionSpec[];

export type FunctionId = (typeof functionTable)[number]["id"];
