import type { LagRule } from "../../core/covariance/choice.ts";
import { whiteWishes } from "../../core/decision/wish.ts";
import type { Transform } from "../../core/design/model.ts";
import type { ColumnSetup, Setup } from "../setup.ts";
import { type Reader, eitherOf, flag, listOf, number, objectOf, oneOf, orNull, since, text } from "./readers.ts";

const transform: Reader<Transform> = eitherOf<Transform>(
  objectOf({ kind: oneOf("none", "logarithm", "square") }),
  objectOf({ kind: oneOf("lag", "change", "growth rate"), periods: number }),
);

const lagRule: Reader<LagRule> = eitherOf<LagRule>(
  objectOf({ kind: oneOf("given"), lags: number }),
  objectOf({ kind: oneOf("careful", "thumb", "cube root") }),
  objectOf({ kind: oneOf("newey-west 1994"), prewhiten: flag }),
  objectOf({
    kind: oneOf("andrews 1991"),
    kernel: oneOf("bartlett", "parzen", "quadratic spectral"),
    prewhiten: flag,
  }),
);

const column: Reader<ColumnSetup> = objectOf<ColumnSetup>({
  column: text,
  role: oneOf("outcome", "driver", "time", "group", "second group", "unused"),
  guessed: flag,
  as: oneOf("number", "category", "date"),
  base: orNull(text),
  transform,
  also: since(transform, { kind: "none" }),
  unit: text,
  against: number,
  textNumbers: orNull(oneOf(".", ",")),
});

const options: Reader<Setup["options"]> = objectOf<Setup["options"]>({
  policy: oneOf("careful", "textbook", "always-robust"),
  fixed: orNull(objectOf({ errors: oneOf("classical", "white", "newey-west", "grouped"), reason: orNull(text) })),
  whiteVersion: oneOf(...whiteWishes),
  groupedVersion: oneOf("CR0", "CR1", "CR2"),
  lags: orNull(lagRule),
  adjusted: flag,
  level: number,
  breakAfter: since(orNull(number), null),
  predictFor: since(oneOf("mean", "single row"), "mean"),
  estimates: since(listOf(text), []),
  jointTest: since(listOf(text), []),
});

/** A set-up as it was stored; whatever is not as a set-up should be makes it none. */
export const readSetup: Reader<Setup> = objectOf<Setup>({
  columns: listOf(column),
  rows: oneOf("cases", "time", "groups"),
  rowsGuessed: flag,
  constant: flag,
  visibleOnly: flag,
  calendar: listOf(oneOf("trend", "month indicators", "quarter indicators")),
  options,
});
