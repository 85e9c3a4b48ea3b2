/**
 * The newest of each requirement set that the stand-in answers: the host's own object model (ExcelApi), the shared runtime and
 * worksheet functions, and the sets that the client library asks for on its own account.
 */
const newest: Readonly<Record<string, string>> = {
  ExcelApi: "1.12",
  SharedRuntime: "1.1",
  CustomFunctionsRuntime: "1.3",
  CustomFunctions: "1.9",
  DelayForCellEdit: "1.1",
};

/** Whether a requirement set is among those answered; a version left out asks for the first. */
export function isSetSupported(
  name: string,
  version: string | number = "1.1",
  sets: Readonly<Record<string, string>> = newest,
): boolean {
  const known = Object.entries(sets).find(([set]) => set.toLowerCase() === name.toLowerCase());
  return known !== undefined && isAtMost(String(version), known[1]);
}

function isAtMost(wanted: string, known: string): boolean {
  const [wantedMajor = 1, wantedMinor = 0] = wanted.split(".").map(Number);
  const [major = 1, minor = 0] = known.split(".").map(Number);
  return wantedMajor < major || (wantedMajor === major && wantedMinor <= minor);
}

/** Sets as a host of another age would report them, for tests. */
export const withExcelApi = (version: string): Readonly<Record<string, string>> => ({ ...newest, ExcelApi: version });
