import type { ColumnDescription } from "./describe.ts";
import { numberedThing } from "./periodLabels.ts";

/** A guess at what each column is for; the user is told that it is one. */
export interface ProposedRoles {
  readonly outcome: string | null;
  readonly drivers: readonly string[];
  readonly time: string | null;
  readonly groups: string | null;
  readonly rowsAre: "cases" | "time" | "groups";
}

/**
 * Guesses roles: the first column of dates or periods is time, the first column of numbers the outcome, the other
 * numbers are drivers, unless they are more than anyone would mean at once or than the rows could tell apart: then the
 * user names them. Numbers that never vary or merely count the rows are left aside. Where times repeat and a column of
 * words tells the rows of a time apart, rows are in groups.
 */
export function proposeRoles(descriptions: readonly ColumnDescription[]): ProposedRoles {
  const time = descriptions.find(isTime) ?? descriptions.find(isRunningTime) ?? null;
  const numbers = descriptions.filter((one) => isUsefulNumber(one) && one !== time).map(({ name }) => name);
  const [outcome = null, ...others] = numbers;
  const rows = descriptions[0]?.counts.rows ?? 0;
  const isPlausible = others.length <= mostDrivers && others.length + 1 < rows;
  return { outcome, drivers: isPlausible ? others : [], ...rowsIn(time, descriptions) };
}

/** Of more columns of numbers none is taken for a driver. */
const mostDrivers = 30;

function rowsIn(
  time: ColumnDescription | null,
  descriptions: readonly ColumnDescription[],
): Pick<ProposedRoles, "time" | "groups" | "rowsAre"> {
  const repeats = time?.time?.repeats === true;
  if (time !== null && !repeats) return { time: time.name, groups: null, rowsAre: "time" };
  const groups = time === null ? null : groupsBeside(time, descriptions);
  if (time === null || groups === null) return { time: null, groups: null, rowsAre: "cases" };
  return { time: time.name, groups, rowsAre: "groups" };
}

const isTime = ({ holds, constant }: ColumnDescription): boolean =>
  (holds === "dates" || holds === "periods") && !constant;

/** A column that counts weeks, months or the like, or is simply called time. */
const isRunningTime = ({ name, counter }: ColumnDescription): boolean =>
  counter && (numberedThing(name) !== null || /^(?:t|time|period)\b/i.test(name));

const isUsefulNumber = ({ holds, constant, counter }: ColumnDescription): boolean =>
  holds === "numbers" && !constant && !counter;

/** Words that occur about once with each time: levels times times make up at least the rows. */
function groupsBeside(time: ColumnDescription, descriptions: readonly ColumnDescription[]): string | null {
  const times = time.time?.distinct ?? 0;
  const group = descriptions.find(
    ({ holds, distinct, counts }) =>
      (holds === "categories" || holds === "text") &&
      distinct > 1 &&
      distinct < counts.rows &&
      distinct * times >= counts.rows - counts.blanks,
  );
  return group?.name ?? null;
}
