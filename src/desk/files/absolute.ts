/** "A1:B9" as "$A$1:$B$9". */
export const absolute = (area: string): string => area.replaceAll("$", "").replace(/([A-Z]+)(\d+)/gi, "$$$1$$$2");
