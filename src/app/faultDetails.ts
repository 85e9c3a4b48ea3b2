/** What a report of a fault of ours needs, as text that can be copied. */
export const detailsOf = (fault: unknown): string =>
  fault instanceof Error ? (fault.stack ?? `${fault.name}: ${fault.message}`) : String(fault);
