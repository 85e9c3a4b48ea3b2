import { type ReactNode, useState } from "react";
import { TextField } from "./TextField.tsx";

export interface NumberFieldProps {
  readonly label: string;
  readonly value: number;
  readonly onNumber: (value: number) => void;
  /** Says why a number will not do; null where it will. */
  readonly fault?: (value: number) => string | null;
}

/** A field for a number. What is typed stays until it is one; the last good number holds meanwhile. */
export function NumberField({ label, value, onNumber, fault = () => null }: NumberFieldProps): ReactNode {
  const [typed, setTyped] = useState<string | null>(null);
  const complaint = typed === null ? null : complaintOf(typed, fault);
  const change = (text: string): void => {
    setTyped(text);
    if (complaintOf(text, fault) === null) onNumber(readNumber(text));
  };
  return (
    <TextField
      label={label}
      inputMode="decimal"
      value={typed ?? String(value)}
      onText={change}
      complaint={complaint}
      onBlur={() => complaint === null && setTyped(null)}
    />
  );
}

/** Decimals may be typed with a comma. */
const readNumber = (text: string): number => (text.trim() === "" ? NaN : Number(text.trim().replace(",", ".")));

function complaintOf(text: string, fault: (value: number) => string | null): string | null {
  const number = readNumber(text);
  return Number.isFinite(number) ? fault(number) : "Type a number.";
}
