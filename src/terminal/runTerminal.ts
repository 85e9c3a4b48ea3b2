import { messageOf } from "../core/problem/messages.ts";
import { nearestName } from "../core/problem/nearestName.ts";
import type { Problem } from "../core/problem/problem.ts";
import { type Result, success } from "../core/problem/result.ts";
import { type Surroundings, answerCommand } from "./answerCommand.ts";
import { readAnswerCommand } from "./arguments.ts";
import { readReviewCommand } from "./reviewArguments.ts";
import { reviewCommand } from "./reviewCommand.ts";
import { usage } from "./usage.ts";

/**
 * What a run printed where, and its exit status: 0 done, 3 done and a finding changes a conclusion, 2 a fault of the
 * input, 1 a fault of the program.
 */
export interface Ran {
  readonly status: 0 | 1 | 2 | 3;
  readonly out: string;
  readonly err: string;
}

type Done = Result<Pick<Ran, "status" | "out">>;

/** Every command: it reads the words after its name, and does what they ask. */
const commands: Readonly<Record<string, (words: readonly string[], world: Surroundings) => Promise<Done>>> = {
  answer: async (words, world) => {
    const command = readAnswerCommand(words);
    if (!command.ok) return command;
    const printed = await answerCommand(command.value, world);
    return printed.ok ? success({ status: 0, out: printed.value }) : printed;
  },
  review: async (words, world) => {
    const command = readReviewCommand(words);
    if (!command.ok) return command;
    const reviewed = await reviewCommand(command.value, world);
    return reviewed.ok
      ? success({ status: reviewed.value.changesConclusion ? 3 : 0, out: reviewed.value.out })
      : reviewed;
  },
};

/** Runs the words of a command line. */
export async function runTerminal(words: readonly string[], world: Surroundings): Promise<Ran> {
  const [name, ...rest] = words;
  if (name === undefined || words.includes("--help") || name === "help") return { status: 0, out: usage, err: "" };
  const json = rest.includes("--json");
  const command = Object.hasOwn(commands, name) ? commands[name] : undefined;
  if (command === undefined) {
    const allowed = Object.keys(commands);
    const nearest = nearestName(name, allowed);
    return faulty({ code: "unknown-value", setting: "command", value: name, allowed, nearest }, json);
  }
  try {
    const done = await command(rest, world);
    return done.ok ? { ...done.value, out: `${done.value.out}\n`, err: "" } : faulty(done.problem, json);
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
