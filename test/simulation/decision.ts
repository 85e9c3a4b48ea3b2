import { parseArgs } from "node:util";
import { type Cell, cells } from "./cells.ts";
import { falseAlarms } from "./falseAlarms.ts";

/**
 * How often the four-case procedure calls a slope of zero real at 5 %, on three kinds of data, beside what the Monte
 * Carlo behind the policies found there: `npx tsx test/simulation/decision.ts [--draws N] [--seed N]`, as a table.
 */
const { values } = parseArgs({
  options: { draws: { type: "string", default: "50000" }, seed: { type: "string", default: "1" } },
});
const [draws, seed] = [Number(values.draws), Number(values.seed)];

/** Draws behind each rate of that Monte Carlo. */
const drawsFound = 40_000;

const perCent = (share: number, digits: number): string => (100 * share).toFixed(digits);

const squaredError = (share: number, count: number): number => (share * (1 - share)) / count;

function line(cell: Cell): string {
  const { "textbook, looks at half": half, textbook, careful } = falseAlarms(cell, { draws, seed });
  const error = squaredError(half, draws);
  const apart = (half - cell.found) / Math.sqrt(error + squaredError(cell.found, drawsFound));
  const rates = `${perCent(half, 2)} ± ${perCent(Math.sqrt(error), 2)} | ${perCent(cell.found, 1)} | ${apart.toFixed(1)}`;
  return `| ${cell.rows}, n = ${cell.rowCount}: ${cell.name} | ${rates} | ${perCent(textbook, 1)} | ${perCent(careful, 1)} |\n`;
}

process.stdout.write(
  "| rows | textbook, looks at half | found before | standard errors apart | textbook | careful |\n",
);
process.stdout.write("|---|---|---|---|---|---|\n");
for (const cell of cells) process.stdout.write(line(cell));
