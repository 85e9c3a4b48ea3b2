import { type FunctionSpec, functionTable } from "./functionTable.ts";

/** How a formula calls it, what may be left out in brackets: "=FOOTING.LAGS(rows, [rule])". */
const callOf = ({ id, parameters }: FunctionSpec): string =>
  `=FOOTING.${id}(${parameters.map(({ name, optional }) => (optional ? `[${name}]` : name)).join(", ")})`;

/** The functions as they are listed to a reader. */
export const listedFunctions = functionTable.map((spec: FunctionSpec) => ({ ...spec, call: callOf(spec) }));
