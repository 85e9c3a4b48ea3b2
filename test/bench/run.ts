import { fork } from "node:child_process";
import { fileURLToPath } from "node:url";
import { parseArgs } from "node:util";
import type { Size } from "./data.ts";
import { jobs } from "./jobs.ts";

/**
 * Times each job in a process of its own, so that peak memory is the job's: `npm run bench -- --rows N --drivers K`.
 * `--jobs fit,white` takes some of them, `--json` writes [{job, rows, drivers, medianMs, peakMb}].
 */
interface Timing {
  readonly job: string;
  readonly rows: number;
  readonly drivers: number;
  readonly medianMs: number;
  readonly peakMb: number;
}

const { values } = parseArgs({
  options: {
    rows: { type: "string", default: "1048575" },
    drivers: { type: "string", default: "20" },
    jobs: { type: "string", default: Object.keys(jobs).join(",") },
    runs: { type: "string", default: "5" },
    json: { type: "boolean", default: false },
    alone: { type: "boolean", default: false },
  },
});
const asked: Size = { rows: Number(values.rows), drivers: Number(values.drivers) };

if (values.alone) process.send?.(await timed(values.jobs));
else await timeAll(values.jobs.split(","));

async function timed(name: string): Promise<Timing> {
  const job = jobs[name];
  if (job === undefined) throw new Error(`There is no job ${name}; jobs are ${Object.keys(jobs).join(", ")}.`);
  const size = job.size ?? asked;
  const run = job.prepare(size);
  await run();
  const times: number[] = [];
  for (let count = 0; count < Number(values.runs); count++) {
    const start = performance.now();
    await run();
    times.push(performance.now() - start);
  }
  times.sort((one, other) => one - other);
  const medianMs = Math.round(times[Math.floor(times.length / 2)]! * 10) / 10;
  return { job: name, ...size, medianMs, peakMb: Math.round(process.resourceUsage().maxRSS / 1024) };
}

async function timeAll(names: readonly string[]): Promise<void> {
  const timings: Timing[] = [];
  for (const name of names) {
    const timing = await inOwnProcess(name);
    timings.push(timing);
    if (!values.json) process.stdout.write(`${line(timing)}\n`);
  }
  if (values.json) process.stdout.write(`${JSON.stringify(timings, null, 2)}\n`);
}

function inOwnProcess(name: string): Promise<Timing> {
  const settings = ["--rows", values.rows, "--drivers", values.drivers, "--runs", values.runs, "--jobs", name];
  const child = fork(fileURLToPath(import.meta.url), [...settings, "--alone"]);
  return new Promise((resolve, reject) => {
    child.once("message", (timing) => resolve(timing as Timing));
    child.once("exit", (code) => {
      if (code !== 0) reject(new Error(`The job ${name} ended with status ${code}.`));
    });
  });
}

function line({ job, rows, drivers, medianMs, peakMb }: Timing): string {
  return `${job.padEnd(16)} ${rows} rows, ${drivers} drivers ${medianMs.toFixed(1).padStart(10)} ms ${String(peakMb).padStart(6)} MB`;
}
