import { type FunctionSpec, type ParameterSpec, functionTable } from "./functionTable.ts";

/** Stands for the address the add-in is served from; the build puts that in its place. */
const address = "FOOTING_URL";

/** What Excel must know of the functions before any of their code runs: its custom functions JSON. */
export const functionsMetadata = () => ({
  /** Formatted numbers and other rich cells reach the functions, which take the plain value out of them. */
  allowCustomDataForDataTypeAny: true,
  /** Cells with errors reach the functions, which say where they stand; without this Excel would not call at all. */
  allowErrorForDataTypeAny: true,
  functions: functionTable.map(functionMetadata),
});

const functionMetadata = ({ id, description, parameters, gives }: FunctionSpec) => ({
  id,
  name: id,
  description: `${description} ${gives}`,
  helpUrl: `${address}/help.html#${id.toLowerCase()}`,
  parameters: parameters.map(parameterMetadata),
  result: { dimensionality: "matrix" as const },
  /** By their addresses zeros are told from blank cells on versions of Excel that hand both over alike. */
  options: { cancelable: true, ...(parameters.some(isOverData) && { requiresParameterAddresses: true }) },
});

const isOverData = ({ name }: ParameterSpec): boolean => name === "outcome";

const parameterMetadata = ({ name, description, shape, optional }: ParameterSpec) => ({
  name,
  description,
  /** No conversion: a blank, a zero, a text and an error stay what they are. */
  type: "any" as const,
  dimensionality: dimensionalities[shape],
  optional,
});

const dimensionalities = { cells: "matrix", "one value": "scalar" } as const;
