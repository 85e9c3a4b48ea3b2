import { type Result, failure, success } from "../problem/result.ts";
import { hiddenNotes } from "../table/hiddenRows.ts";
import type { Source } from "../table/source.ts";
import type { Design, Term } from "./design.ts";
import { type Ingredient, gather } from "./ingredient.ts";
import { type ReadModel, readModel } from "./readModel.ts";
import type { Model } from "./model.ts";
import { roleFault } from "./roleFaults.ts";
import { rowOrderOf } from "./rowOrder.ts";
import { type UsedRows, chooseRows } from "./usedRows.ts";

/**
 * Turns columns and a model into numbers: outcome y and terms X (the constant first) over the rows that lack nothing,
 * in order of time or group by group.
 * @param source - columns of equal height; blank cells and marks for missing values leave their row out.
 * @returns the design, every row left out with its cell and reason; Problems of roles, headings, cells, times, groups,
 *   categories and transforms as they are found, and "too-few-rows" where there are fewer than one more than drivers.
 */
export function buildDesign(source: Source, model: Model): Result<Design> {
  const roles = roleFault(model);
  if (roles !== null) return failure(roles);
  const read = readModel(source, model);
  if (!read.ok) return read;
  const used = chooseRows(source, read.value);
  if (!used.ok) return used;
  const constants = model.constant ? 1 : 0;
  const fewest = constants + model.drivers.length + model.calendar.length + 1;
  if (used.value.rows.length < fewest) return failure(tooFewRows(used.value, fewest));
  const terms = allTerms(read.value.drivers, used.value.rows, model.constant);
  if (!terms.ok) return terms;
  return designOf({ source, model, read: read.value, used: used.value, terms: terms.value });
}

const tooFewRows = ({ rows, leftOutCount }: UsedRows, needed: number) =>
  ({ code: "too-few-rows", rows: rows.length, needed, leftOut: leftOutCount }) as const;

function allTerms(drivers: readonly Ingredient[], rows: Int32Array, constant: boolean): Result<readonly Term[]> {
  const ones = new Float64Array(rows.length).fill(1);
  const terms: Term[] = constant ? [{ name: "constant", meaning: { kind: "constant" }, values: ones }] : [];
  for (const driver of drivers) {
    const made = driver.terms(rows);
    if (!made.ok) return made;
    terms.push(...made.value);
  }
  return success(terms);
}

interface Parts {
  readonly source: Source;
  readonly model: Model;
  readonly read: ReadModel;
  readonly used: UsedRows;
  readonly terms: readonly Term[];
}

function designOf({ source, model, read, used, terms }: Parts): Result<Design> {
  const order = rowOrderOf(read.frame, used.rows);
  if (!order.ok) return order;
  const { column, name, values } = read.outcome;
  const { transform } = model.outcome;
  return success({
    outcome: { name, column: column.name, transform, values: gather(values, used.rows) },
    terms,
    hasConstant: model.constant,
    rowCount: used.rows.length,
    order: order.value,
    sourceRows: used.rows,
    leftOut: used.leftOut,
    leftOutCount: used.leftOutCount,
    notes: [...(source.notes ?? []), ...hiddenNotes(source), ...read.notes, ...baseNotes(terms)],
  });
}

/** Which level the others of each category are compared with. */
function baseNotes(terms: readonly Term[]): string[] {
  const bases = terms.flatMap(({ meaning }) => {
    if (meaning.kind === "level") return [`${meaning.column}: the other categories are compared with ${meaning.base}.`];
    return meaning.kind === "season" ? [`${meaning.base} is what the others of the season are compared with.`] : [];
  });
  return [...new Set(bases)];
}
