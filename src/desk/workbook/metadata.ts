/** What functions.json says of one worksheet function; the parts that a host acts on. */
export interface FunctionMetadata {
  readonly id: string;
  readonly name: string;
  readonly description?: string;
  readonly parameters: readonly ParameterMetadata[];
  readonly options?: {
    readonly cancelable?: boolean;
    readonly stream?: boolean;
    readonly volatile?: boolean;
    readonly requiresAddress?: boolean;
    readonly requiresParameterAddresses?: boolean;
  };
}

export interface ParameterMetadata {
  readonly name: string;
  readonly description?: string;
  readonly type?: string;
  readonly dimensionality?: "scalar" | "matrix";
  readonly optional?: boolean;
  readonly repeating?: boolean;
}

export interface FunctionsMetadata {
  readonly allowErrorForDataTypeAny?: boolean;
  readonly allowCustomDataForDataTypeAny?: boolean;
  readonly functions: readonly FunctionMetadata[];
}

/** The three ways in which builds of Excel hand a blank cell to a function of type any. */
export type BlankArrival = "" | 0 | null;
