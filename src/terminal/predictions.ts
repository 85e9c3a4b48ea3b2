import type { Inquirer } from "../app/analyst.ts";
import type { Errand } from "../app/errand.ts";
import type { Host } from "../app/host.ts";
import { alignedLines } from "../core/answer/alignedLines.ts";
import type { Answer } from "../core/answer/answer.ts";
import type { Prediction } from "../core/inference/predict.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { addressOf, parseAddress } from "../core/table/address.ts";
import { plainHeading } from "../core/table/headingRow.ts";
import { type LocatedTable, readBlock } from "../core/table/locate.ts";
import { rowNumberOf } from "../core/table/place.ts";
import type { Source } from "../core/table/source.ts";
import { findTable } from "./findTable.ts";
import type { Asked } from "./question.ts";

/** What is expected of new rows: each by its row in the sheet, null for one that lacks a driver. */
export interface Predicted {
  readonly rows: readonly { readonly row: number; readonly prediction: Prediction | null }[];
  /** Why there is no interval for a single row, or no prediction at all; null where there is. */
  readonly because: string | null;
}

/** The new rows' place, and whose they are. */
export interface Wanted {
  /** A sheet, or a range with its headings. */
  readonly place: string;
  readonly sheet: string | null;
  readonly asked: Asked;
  readonly answer: Answer;
}

interface World {
  readonly host: Host;
  readonly analyst: Inquirer;
  readonly errand: Errand;
}

/**
 * Reads new rows of the drivers and predicts them under the standard errors in force.
 * @returns Problems of finding and reading the rows.
 */
export async function predictionsOf(wanted: Wanted, { host, analyst, errand }: World): Promise<Result<Predicted>> {
  const { answer, asked } = wanted;
  const table = await newRows(host, wanted, errand);
  if (!table.ok) return table;
  const rows = namedAsDrivers(table.value.source, driversOf(asked));
  const { errors } = answer.decision.inForce;
  const { reference } = answer.inference.inForce;
  const { spread } = answer.decision.fourCase;
  const settings = { reference, level: answer.options.level, spread };
  const found = await analyst.inquire(asked.question, { kind: "predictions", errors, settings, rows }, errand);
  if (!found.ok) return found;
  if (found.value.kind === "not-applicable") return success({ rows: [], because: found.value.because });
  if (found.value.kind !== "predictions") throw new Error(`New rows were answered with ${found.value.kind}.`);
  const [column] = rows.columns;
  return success({
    rows: found.value.rows.map((prediction, row) => ({
      row: column === undefined ? row + 1 : rowNumberOf(column.place, row),
      prediction,
    })),
    because: found.value.noSingle,
  });
}

const driversOf = ({ question: { model } }: Asked): string[] => [...new Set(model.drivers.map(({ column }) => column))];

async function newRows(host: Host, { place, sheet, asked }: Wanted, errand: Errand): Promise<Result<LocatedTable>> {
  const area = parseAddress(place);
  const headings = driversOf(asked);
  if (area === null) return findTable(host, { sheet: place, headings }, errand);
  const whole = area.sheet === "" ? sheetOf(asked, sheet) : area.sheet;
  if (whole === null) return failure({ code: "bad-address", address: place });
  const block = await host.read({ kind: "address", address: addressOf({ ...area, sheet: whole }) }, errand);
  return block.ok ? readBlock(block.value, headings) : block;
}

/** A range without a sheet is on the one that was named, or on that of the data. */
function sheetOf({ question }: Asked, named: string | null): string | null {
  const place = question.source.columns[0]?.place;
  return named ?? (place?.kind === "sheet" ? place.sheet : null);
}

/** Headings in another case or spacing take the drivers' own names. */
const namedAsDrivers = (source: Source, drivers: readonly string[]): Source => ({
  ...source,
  columns: source.columns.map((column) => ({
    ...column,
    name: drivers.find((driver) => plainHeading(driver) === plainHeading(column.name)) ?? column.name,
  })),
});

/** What a person reads of them: a line a row, numbers to five significant digits. */
export function predictionLines({ rows, because }: Predicted): string[] {
  const single = rows.some(({ prediction }) => prediction !== null && prediction.single !== null);
  const headings = ["row", "expected", "mean from", "to", ...(single ? ["single row from", "to"] : []), ""];
  const lines = rows.map(({ row, prediction }) => [String(row), ...cellsOf(prediction, single)]);
  const table = rows.length === 0 ? [] : alignedLines([headings, ...lines]);
  return ["Predictions", ...table, ...(because === null ? [] : [because]), ""];
}

function cellsOf(prediction: Prediction | null, single: boolean): string[] {
  if (prediction === null) return ["", "", "", ...(single ? ["", ""] : []), "a driver is missing"];
  const { value, low, high, single: one, beyond } = prediction;
  const figures = [value, low, high, ...(single && one !== null ? [one.low, one.high] : [])];
  return [...figures.map(shown), beyond ? "farther out than every row used" : ""];
}

const shown = (value: number): string => String(Number(value.toPrecision(5)));
