import type { HostProblem } from "../core/problem/problem.ts";

/** What Excel's client throws: a code that is the same in every language, and where it happened. */
export interface ExcelFault {
  readonly code: string;
  readonly message: string;
  readonly debugInfo?: { readonly errorLocation?: string };
}

/** Told by its shape: in Node the client lives in a realm of its own, where instanceof does not reach. */
export const isExcelFault = (fault: unknown): fault is ExcelFault =>
  typeof fault === "object" &&
  fault !== null &&
  "code" in fault &&
  typeof fault.code === "string" &&
  "message" in fault;

const codes = {
  /** Gone by itself after a moment. */
  passing: ["ServiceNotAvailable", "ActivityLimitReached", "RequestAborted"],
  /** Too many cells at once. */
  size: [
    "RequestPayloadSizeLimitExceeded",
    "ResponsePayloadSizeLimitExceeded",
    "RangeExceedsLimit",
    "OperationCellsExceedLimit",
    "MemoryLimitReached",
  ],
  /** Nothing that a user did brings these about: the add-in asked wrongly. */
  ours: [
    "InvalidArgument",
    "InvalidObjectPath",
    "InvalidRequestContext",
    "PropertyNotLoaded",
    "ValueNotLoaded",
    "EmptyChartSeries",
  ],
} as const;

const among = (list: readonly string[]) => (fault: unknown) => isExcelFault(fault) && list.includes(fault.code);

export const isPassing = among(codes.passing);
export const isTooMuchAtOnce = among(codes.size);
export const hasCode = (code: string): ((fault: unknown) => boolean) => among([code]);

/** What Excel refused, as something the user can mend; null where the fault is ours. */
export function problemOf(fault: unknown): HostProblem | null {
  if (!isExcelFault(fault) || among(codes.ours)(fault)) return null;
  if (isPassing(fault)) return { code: "excel-busy" };
  const place = fault.debugInfo?.errorLocation;
  switch (fault.code) {
    case "InvalidOperationInCellEditMode":
      return { code: "cell-being-edited" };
    case "InvalidSelection":
    case "InactiveWorkbook":
      return { code: "other-workbook" };
    case "ApiNotFound":
    case "ApiNotAvailable":
      return { code: "excel-too-old", missing: place || fault.message };
    case "AccessDenied":
      return { code: "read-only" };
    default:
      return { code: "excel-refused", detail: [fault.code, fault.message, place].filter(Boolean).join(", ") };
  }
}
