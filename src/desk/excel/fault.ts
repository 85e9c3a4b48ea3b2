/** What Excel answers when it will not do something: its code and a message that is not meant for users. */
export interface HostFault extends Error {
  readonly code: string;
}

const messages = {
  AccessDenied: "You cannot perform the requested operation.",
  ApiNotFound: "The API you're trying to use could not be found.",
  EmptyChartSeries: "The attempted operation failed because the chart series is empty.",
  GeneralException: "There was an internal error while processing the request.",
  InvalidArgument: "The argument is invalid or missing or has an incorrect format.",
  InvalidObjectPath: "The object path is not working for what you're trying to do.",
  InvalidOperation: "The operation attempted is invalid on the object.",
  InvalidOperationInCellEditMode:
    "Excel is in cell-editing mode. Please exit the edit mode by pressing ENTER or TAB or selecting another cell, and then try again.",
  InvalidReference: "This reference is not valid for the current operation.",
  InvalidSelection: "The current selection is invalid for this operation.",
  ItemAlreadyExists: "The resource being created already exists.",
  ItemNotFound: "The requested resource doesn't exist.",
  RequestPayloadSizeLimitExceeded: "The request payload size has exceeded the limit.",
  ResponsePayloadSizeLimitExceeded: "The response payload size has exceeded the limit.",
} as const;

export type FaultCode = keyof typeof messages;

export function fault(code: FaultCode, detail = ""): HostFault {
  const message = detail === "" ? messages[code] : `${messages[code]} ${detail}`;
  return Object.assign(new Error(message), { code });
}

export const isFault = (error: unknown): error is HostFault => error instanceof Error && "code" in error;
