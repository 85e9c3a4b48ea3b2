import type { ICellData, Nullable } from "@univerjs/core";
import {
  ArrayValueObject,
  type BaseReferenceObject,
  type BaseValueObject,
  type FunctionVariantType,
} from "@univerjs/engine-formula";
import { isFormula, kindOf, valueOf } from "./cells.ts";
import { elementText, type Element } from "./elementTexts.ts";
import type { BlankArrival, ParameterMetadata } from "./metadata.ts";

/** An argument as it goes to the add-in, in JSON; or the error sign that keeps the call from being made. */
export type ArgumentText = { readonly text: string } | { readonly error: string };

export interface Shaping {
  readonly blank: BlankArrival;
  /** Whether the functions' metadata lets error values reach parameters of type any. */
  readonly errorsPass: boolean;
  /** Texts of ranges already spelled out since the last change: many calls read the same range. */
  readonly spelled: Map<string, ArgumentText>;
}

type Block = readonly (readonly Element[])[];

const isRefused = (argument: ArgumentText): argument is { readonly error: string } => "error" in argument;

/** Spells out one argument as Excel shapes it for the parameter's type and dimensionality. */
export function argumentText(
  variant: FunctionVariantType | undefined,
  parameter: ParameterMetadata,
  shaping: Shaping,
): ArgumentText {
  if (variant === undefined) return { text: "null" };
  if (variant.isReferenceObject()) return rangeText(variant as BaseReferenceObject, parameter, shaping);
  const value = variant as BaseValueObject;
  // An argument left out between commas; a reference to a blank cell is something else.
  if (value.isNull()) return { text: "null" };
  const block = value instanceof ArrayValueObject ? blockOf(value) : [[elementOfValue(value)]];
  return blockText(block, parameter, shaping);
}

function rangeText(range: BaseReferenceObject, parameter: ParameterMetadata, shaping: Shaping): ArgumentText {
  if (range.isMultiArea()) return { error: "#VALUE!" };
  const { startRow, startColumn, endRow, endColumn } = range.getRangePosition();
  const { type = "any", dimensionality = "scalar" } = parameter;
  const key = [range.getSheetId(), startRow, startColumn, endRow, endColumn, type, dimensionality].join(" ");
  const known = shaping.spelled.get(key);
  if (known !== undefined) return known;
  const text = blockText(readRange(range), parameter, shaping);
  shaping.spelled.set(key, text);
  return text;
}

function readRange(range: BaseReferenceObject): Block {
  const { startRow, startColumn, endRow, endColumn } = range.getRangePosition();
  const elementAt = elementsOfRange(range);
  const rows = new Array<readonly Element[]>(endRow - startRow + 1);
  for (let row = startRow; row <= endRow; row++) {
    const line = new Array<Element>(endColumn - startColumn + 1);
    for (let column = startColumn; column <= endColumn; column++) line[column - startColumn] = elementAt(row, column);
    rows[row - startRow] = line;
  }
  return rows;
}

/**
 * The engine's own reading of a cell builds two matrices each time. What this calculation computed stands first, then
 * the sheet; only cells under a spill need the engine's longer way, which knows whether the spill still holds.
 */
function elementsOfRange(range: BaseReferenceObject): (row: number, column: number) => Element {
  const computed = orNothing(range.getCurrentRuntimeSheetData());
  const spilled = orNothing(range.getCurrentRuntimeActiveArrayFormulaCellData());
  const spilledBefore = orNothing(range.getCurrentActiveArrayFormulaCellData());
  const stored = orNothing(range.getCurrentActiveSheetData())?.cellData;
  return (row, column) => {
    const fresh = computed?.getValue(row, column) ?? spilled?.getValue(row, column);
    if (fresh !== undefined && fresh !== null) return elementOfResult(fresh);
    if ((spilledBefore?.getValue(row, column) ?? null) === null) return elementOfCell(stored?.getValue(row, column));
    const cell = range.getCellData(row, column);
    return isFormula(cell ?? undefined) ? elementOfCell(cell) : elementOfResult(cell);
  };
}

/** The engine's declarations promise more than there is: a sheet without results has no matrix of them. */
const orNothing = <T>(value: T): T | undefined => value;

function elementOfCell(cell: Nullable<ICellData>): Element {
  const kind = kindOf(cell ?? undefined);
  if (kind === "Empty") return null;
  const value = valueOf(cell ?? undefined);
  return kind === "Error" ? { error: String(value) } : { value };
}

/** A formula's "" is text, where a cell's own would be blank. */
function elementOfResult(cell: Nullable<ICellData>): Element {
  return cell?.v === "" ? { value: "" } : elementOfCell(cell);
}

function elementOfValue(value: BaseValueObject): Element {
  if (value.isNull()) return null;
  if (value.isError()) return { error: String(value.getValue()) };
  return { value: value.getValue() };
}

function blockOf(array: ArrayValueObject): Block {
  return array.getArrayValue().map((row) => row.map((value) => (value ? elementOfValue(value) : null)));
}

function blockText(block: Block, parameter: ParameterMetadata, { blank, errorsPass }: Shaping): ArgumentText {
  const { type = "any", dimensionality = "scalar" } = parameter;
  // More cells than a scalar parameter takes: Excel makes no call.
  if (dimensionality === "scalar" && (block.length !== 1 || block[0]?.length !== 1)) return { error: "#VALUE!" };
  const rows = new Array<string>(block.length);
  for (const [index, row] of block.entries()) {
    const texts = new Array<string>(row.length);
    for (const [column, element] of row.entries()) {
      const text = elementText(element, type, { blank, errorsPass });
      if (isRefused(text)) return text;
      texts[column] = text.text;
    }
    rows[index] = dimensionality === "scalar" ? texts.join(",") : `[${texts.join(",")}]`;
  }
  return { text: dimensionality === "scalar" ? rows.join(",") : `[${rows.join(",")}]` };
}
