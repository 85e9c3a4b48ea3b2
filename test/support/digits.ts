import { expect } from "vitest";

/** Correct significant digits of a figure: -log10 of the relative error, 16 where both agree to the last bit. */
export function digitsOf(found: number, expected: number): number {
  if (found === expected) return 16;
  return -Math.log10(Math.abs(found - expected) / Math.abs(expected === 0 ? 1 : expected));
}

/** At least so many correct significant digits. */
export function expectDigits(found: number, expected: number, digits: number): void {
  expect(digitsOf(found, expected), `${found} against ${expected}`).toBeGreaterThanOrEqual(digits);
}
