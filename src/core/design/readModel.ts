import { type Result, success } from "../problem/result.ts";
import { readNumberCells } from "../table/numberCells.ts";
import type { Column, Source } from "../table/source.ts";
import { calendarDriver } from "./calendarDriver.ts";
import { categoryDriver } from "./categoryDriver.ts";
import { findColumn, sameColumn } from "./columns.ts";
import { dateNumbers } from "./dateDriver.ts";
import type { Ingredient } from "./ingredient.ts";
import type { DriverChoice, Model } from "./model.ts";
import { numberDriver } from "./numberDriver.ts";
import { type RowFrame, groupIngredients, readRowFrame } from "./rowFrame.ts";
import { type Transformed, transformed } from "./transforms.ts";

/** Every column of a model, read over all rows of the source. */
export interface ReadModel {
  readonly frame: RowFrame;
  readonly outcome: Transformed & { readonly column: Column };
  readonly drivers: readonly Ingredient[];
  /** What decides whether a row is used: outcome, groups, drivers. */
  readonly ingredients: readonly Ingredient[];
  readonly notes: readonly string[];
}

/** @returns Problems of headings, cells, times, groups, categories and transforms. */
export function readModel(source: Source, model: Model): Result<ReadModel> {
  const frame = readRowFrame(source, model.rows);
  if (!frame.ok) return frame;
  const outcome = readOutcome(source, model, frame.value);
  if (!outcome.ok) return outcome;
  const drivers: Ingredient[] = [];
  for (const choice of model.drivers) {
    const driver = readDriver({ source, model, frame: frame.value }, choice);
    if (!driver.ok) return driver;
    drivers.push(driver.value);
  }
  for (const choice of model.calendar) {
    const driver = calendarDriver(choice, frame.value.timeline);
    if (!driver.ok) return driver;
    drivers.push(driver.value);
  }
  const { ingredient } = outcome.value;
  const notes = [ingredient, ...drivers].flatMap((one) => one.notes);
  return success({
    frame: frame.value,
    outcome: outcome.value,
    drivers,
    ingredients: [ingredient, ...groupIngredients(frame.value), ...drivers],
    notes: [...new Set([...orderNotes(frame.value), ...notes])],
  });
}

type ReadOutcome = ReadModel["outcome"] & { readonly ingredient: Ingredient };

function readOutcome(source: Source, { outcome, textNumbers }: Model, { lookBack }: RowFrame): Result<ReadOutcome> {
  const column = findColumn(source, outcome.column);
  if (!column.ok) return column;
  const numbers = readNumberCells(column.value, decimalFor(column.value, textNumbers));
  if (!numbers.ok) return numbers;
  const made = transformed({ column: column.value, numbers: numbers.value }, outcome.transform, lookBack);
  if (!made.ok) return made;
  const { present, lackOf } = made.value;
  const ingredient: Ingredient = { present, lackOf, terms: () => success([]), notes: numbers.value.notes };
  return success({ ...made.value, column: column.value, ingredient });
}

const decimalFor = ({ name }: Column, textNumbers: Model["textNumbers"]): "." | "," | null =>
  textNumbers.find(({ column }) => sameColumn(column, name))?.decimal ?? null;

interface Reading {
  readonly source: Source;
  readonly model: Model;
  readonly frame: RowFrame;
}

function readDriver({ source, model, frame }: Reading, choice: DriverChoice): Result<Ingredient> {
  const found = findColumn(source, choice.column);
  if (!found.ok) return found;
  const column = found.value;
  const { transform } = choice;
  switch (choice.as) {
    case "category":
      return categoryDriver(column, choice.base);
    case "number": {
      const numbers = readNumberCells(column, decimalFor(column, model.textNumbers));
      if (!numbers.ok) return numbers;
      const plainly = { kind: "number", column: column.name, transform } as const;
      return numberDriver({ column, numbers: numbers.value }, { transform, plainly }, frame.lookBack);
    }
    case "date": {
      const dates = dateNumbers(column);
      if (!dates.ok) return dates;
      const { numbers, unit } = dates.value;
      const plainly = { kind: "date", column: column.name, unit } as const;
      return numberDriver({ column, numbers }, { transform, plainly }, frame.lookBack);
    }
  }
}

function orderNotes({ kind, timeline, sequence }: RowFrame): string[] {
  if (timeline === null || sequence === null) return [];
  if (timeline.column === null) {
    return kind === "time" ? ["No time column was chosen: the rows are taken in the order in which they stand."] : [];
  }
  const { name } = timeline.column;
  const sorted = kind === "time" && !sequence.asTheyStand;
  return [...timeline.notes, ...(sorted ? [`The rows were not in order of ${name}; they were put in order.`] : [])];
}
