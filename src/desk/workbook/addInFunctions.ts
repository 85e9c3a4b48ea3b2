import {
  ArrayValueObject,
  BaseFunction,
  ERROR_TYPE_SET,
  FunctionType,
  IFunctionService,
  NumberValueObject,
  SetFormulaCalculationNotificationMutation,
  StringValueObject,
  ValueObjectFactory,
  BooleanValueObject,
  type BaseReferenceObject,
  type BaseValueObject,
  type FunctionVariantType,
} from "@univerjs/engine-formula";
import { ICommandService } from "@univerjs/core";
import { argumentText, type Shaping } from "./argumentTexts.ts";
import { fromRange, fullAddress } from "./areas.ts";
import type { Book } from "./book.ts";
import type { BlankArrival, FunctionMetadata, FunctionsMetadata } from "./metadata.ts";
import type { CallOutcome, Calls, Wanted } from "./pendingCalls.ts";
import { flag } from "./styleTables.ts";

/** What a cell shows while an add-in's function is at work. */
const busy = "#BUSY!";

export interface AddInFunctions {
  readonly namespace: string;
  readonly metadata: FunctionsMetadata;
  readonly calls: Calls;
  /** How a blank cell arrives; tests change it. */
  readonly arrival: { blank: BlankArrival };
  /** What is said beside an error, by "sheet row column". */
  readonly messages: Map<string, string>;
}

/** Makes every function of the metadata known to the formula engine; others answer #NAME? by themselves. */
export function registerFunctions(book: Book, add: AddInFunctions): void {
  // The engine knows no such error: taught here, it travels on to dependent formulas like any other.
  (ERROR_TYPE_SET as Set<string>).add(busy);
  const spelled: Shaping["spelled"] = new Map();
  forgetBetweenStages(book, spelled);
  const service = book.grid.injector.get(IFunctionService);
  for (const metadata of add.metadata.functions) {
    const name = `${add.namespace}.${metadata.name}`.toUpperCase();
    service.registerExecutors(new AddInFunction(name, { book, add, metadata, spelled }));
    service.registerDescriptions({
      functionName: name,
      functionType: FunctionType.User,
      description: metadata.description ?? "",
      abstract: metadata.description ?? "",
      functionParameter: metadata.parameters.map((parameter) => ({
        name: parameter.name,
        detail: parameter.description ?? "",
        example: "",
        require: flag(parameter.optional !== true),
        repeat: flag(parameter.repeating === true),
      })),
    });
  }
}

/** Within one stage of a calculation cells that are read do not change; from one to the next they may. */
function forgetBetweenStages(book: Book, spelled: Map<string, unknown>): void {
  const calculating = [4, 7];
  book.grid.injector.get(ICommandService).onCommandExecuted(({ id, params }) => {
    if (id !== SetFormulaCalculationNotificationMutation.id) return;
    const stage = (params as { readonly stageInfo?: { readonly stage: number } } | undefined)?.stageInfo?.stage;
    if (stage === undefined || !calculating.includes(stage)) spelled.clear();
  });
}

interface Setting {
  readonly book: Book;
  readonly add: AddInFunctions;
  readonly metadata: FunctionMetadata;
  readonly spelled: Shaping["spelled"];
}

/** The engine takes functions as objects of its own class. It must never be thrown at: that would end all calculation. */
class AddInFunction extends BaseFunction {
  // References as such: whether a cell is blank, and where it stands, is lost in values.
  override needsReferenceObject = true;
  readonly #setting: Setting;

  constructor(name: string, setting: Setting) {
    super(name);
    this.#setting = setting;
  }

  override calculate(...variants: BaseValueObject[]): BaseValueObject {
    const at = { sheet: this.subUnitId ?? "", row: this.row, column: this.column, rows: 1, columns: 1 };
    try {
      return evaluate(this.#setting, variants, at);
    } catch {
      return errorValue("#VALUE!");
    }
  }
}

type Cell = Parameters<Calls["ask"]>[0];

function evaluate(setting: Setting, variants: readonly FunctionVariantType[], cell: Cell): BaseValueObject {
  const wanted = wantedBy(setting, variants, cell);
  if ("error" in wanted) return errorValue(wanted.error);
  const outcome = setting.add.calls.ask(cell, wanted);
  const place = `${cell.sheet} ${cell.row} ${cell.column}`;
  setting.add.messages.delete(place);
  if (outcome === null) return errorValue(busy);
  if ("error" in outcome && outcome.message !== "") setting.add.messages.set(place, outcome.message);
  return toValue(outcome);
}

/** The call in the form that goes to the add-in, or the error that Excel shows instead of making it. */
function wantedBy(
  { book, add, metadata, spelled }: Setting,
  variants: readonly FunctionVariantType[],
  cell: Cell,
): Wanted | { readonly error: string } {
  const { parameters, options = {} } = metadata;
  const required = parameters.filter(({ optional, repeating }) => optional !== true && repeating !== true).length;
  const repeats = parameters.at(-1)?.repeating === true;
  if (variants.length < required || (!repeats && variants.length > parameters.length)) return { error: "#VALUE!" };
  const errorsPass = add.metadata.allowErrorForDataTypeAny === true;
  const shaping = { blank: add.arrival.blank, errorsPass, spelled };
  const texts: string[] = [];
  for (const [index, parameter] of parameters.entries()) {
    const taken = parameter.repeating === true ? variants.slice(index) : [variants[index]];
    const shaped = taken.map((variant) => argumentText(variant, parameter, shaping));
    const refused = shaped.find((text) => "error" in text);
    if (refused !== undefined) return refused;
    const parts = shaped.map((text) => ("text" in text ? text.text : ""));
    texts.push(parameter.repeating === true ? `[${parts.join(",")}]` : parts.join(""));
  }
  return {
    functionId: metadata.id,
    arguments: texts,
    address: options.requiresAddress === true ? fullAddress(book, cell) : null,
    parameterAddresses:
      options.requiresParameterAddresses === true ? variants.map((one) => addressOf(book, one)) : null,
    cancelable: options.cancelable === true,
  };
}

/** The address of an argument that is a range; an expression has none. */
function addressOf(book: Book, variant: FunctionVariantType): string {
  if (!variant.isReferenceObject()) return "";
  const range = variant as BaseReferenceObject;
  return fullAddress(book, fromRange(range.getSheetId(), range.getRangePosition()));
}

function toValue(outcome: CallOutcome): BaseValueObject {
  if ("error" in outcome) return errorValue(outcome.error);
  const { value } = outcome;
  if (!Array.isArray(value)) return toElement(value);
  const rows = (value as readonly unknown[]).map((row) => (Array.isArray(row) ? (row as unknown[]) : [row]));
  const columns = rows[0]?.length ?? 0;
  // Excel takes a block whose rows differ in length for no block at all.
  if (columns === 0 || rows.some((row) => row.length !== columns)) return errorValue("#VALUE!");
  return ArrayValueObject.create({
    calculateValueList: rows.map((row) => row.map(toElement)),
    rowCount: rows.length,
    columnCount: columns,
    unitId: "",
    sheetId: "",
    row: -1,
    column: -1,
  });
}

/** The engine's factory knows the error signs; the set it knows them by was taught ours. */
const errorValue = (sign: string): BaseValueObject => ValueObjectFactory.create(sign);

/** A value of the add-in in a cell. Null shows as 0, by Excel's design; an error is an object with its sign. */
function toElement(value: unknown): BaseValueObject {
  if (value === null || value === undefined) return NumberValueObject.create(0);
  if (typeof value === "number") return NumberValueObject.create(value);
  if (typeof value === "boolean") return BooleanValueObject.create(value);
  if (typeof value === "string") return StringValueObject.create(value);
  const { type, basicValue, code } = value as { type?: string; basicValue?: unknown; code?: unknown };
  if (type === "Error") return errorValue(String(basicValue ?? code));
  if (type === "FormattedNumber" || type === "Double") return NumberValueObject.create(Number(basicValue));
  if (type === "String") return StringValueObject.create(String(basicValue));
  return errorValue("#VALUE!");
}
