import { messageOf } from "../core/problem/messages.ts";
import type { Problem } from "../core/problem/problem.ts";
import { type Surroundings, answerCommand } from "./answerCommand.ts";
import { readAnswerCommand } from "./arguments.ts";
import { usage } from "./usage.ts";

/** What a run printed where, and its exit status: 0 done, 2 a fault of the input, 1 a fault of the program. */
export interface Ran {
  readonly status: 0 | 1 | 2;
  readonly out: string;
  readonly err: string;
}

/** Runs the words of a command line. */
export async function runTerminal(words: readonly string[], world: Surroundings): Promise<Ran> {
  const [command, ...rest] = words;
  if (command === undefined || words.includes("--help") || command === "help")
    return { status: 0, out: usage, err: "" };
  const json = rest.includes("--json");
  if (command !== "answer")
    return faulty(
      { code: "unknown-value", setting: "command", value: command, allowed: ["answer"], nearest: "answer" },
      json,
    );
  try {
    const read = readAnswerCommand(rest);
    if (!read.ok) return faulty(read.problem, json);
    const printed = await answerCommand(read.value, world);
    return printed.ok ? { status: 0, out: `${printed.value}\n`, err: "" } : faulty(printed.problem, json);
  } catch (fault) {
    const details = fault instanceof Error ? (fault.stack ?? fault.message) : String(fault);
    return {
      status: 1,
      out: "",
      err: `This is a fault of Footing, not of your data. Please report it with these details:\n${details}\n`,
    };
  }
}

/** A fault of the input: its sentence for people, and as data where --json asks for it. */
function faulty(problem: Problem, json: boolean): Ran {
  const message = messageOf(problem);
  const out = json ? `${JSON.stringify({ problem: { ...problem, message } }, null, 2)}\n` : "";
  return { status: 2, out, err: `${message}\n` };
}
