import type { HostProblem, StoredProblem } from "./problem.ts";
import { capitalised, counted, listed } from "./spots.ts";

type Sentence = readonly [whatAndWhere: string, whatToDo: string];

type Spoken = StoredProblem | Extract<HostProblem, { code: "read-only" }>;

/** The sentences about what Footing keeps in a workbook: set-ups, and what it knows of its result sheets. */
export const storedSentences: {
  readonly [Code in Spoken["code"]]: (problem: Extract<Spoken, { code: Code }>) => Sentence;
} = {
  "read-only": () => [
    "Excel does not let this workbook be changed: it is open for reading only, or that part of it is protected.",
    "Ask for the right to edit it, lift the protection, or work in a copy.",
  ],
  "stored-by-newer": ({ version, own }) => [
    `This workbook holds set-ups that a newer Footing stored (format ${version}; this one reads format ${own}).`,
    "They were left as they are. Update Footing to open them.",
  ],
  "stored-unreadable": ({ part }) => [
    `What this workbook keeps for Footing in the part ${part} cannot be read.`,
    "It was left as it is. Store the set-ups again; they go into a part of their own.",
  ],
  "setup-gone": ({ name }) => [
    `There is no set-up "${name}" in the workbook any more.`,
    "Choose another, or store this one again.",
  ],
  "setup-unnamed": () => ["The set-up has no name.", "Type a name for it."],
  "setup-name-taken": ({ name }) => [
    `There is already a set-up "${name}" in the workbook.`,
    "Type another name, or remove that one first.",
  ],
  "setup-data-gone": ({ setup, place, last }) => [
    `The data of ${setup} are no longer found: ${place} is gone from the workbook (its cells stood in ${last} when it was stored).`,
    "Choose the data again; what was chosen for columns of the same name is taken over.",
  ],
  "cells-of-others": ({ sheet, cells, count }) => [
    `${capitalised(counted(count, "cell"))} of the sheet "${sheet}" that the result needs ${count === 1 ? "holds" : "hold"} what Footing did not write: ${listed(cells, count)}.`,
    "Move or empty what stands there, or write the result to a new sheet. Nothing was changed.",
  ],
  "sheet-not-known": ({ sheet }) => [
    `Footing cannot tell its own cells from yours on the sheet "${sheet}", so it does not write over them.`,
    "Write the result to a new sheet.",
  ],
  "too-few-setups": ({ setups }) => [
    `A comparison needs two set-ups or more; ${setups === 0 ? "none is" : "one is"} chosen.`,
    "Choose those to compare.",
  ],
};
