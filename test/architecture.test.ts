import { readFileSync, readdirSync } from "node:fs";
import { dirname, join, normalize, relative } from "node:path";
import { describe, expect, it } from "vitest";

const root = join(import.meta.dirname, "..");
const src = join(root, "src");

/** What each room may import, beside itself. Imports run one way. */
const core = ["problem", "numeric", "table", "design", "fit", "covariance"];
const mayImport: Readonly<Record<string, readonly string[]>> = {
  "core/problem": [],
  "core/numeric": upTo(1),
  "core/table": upTo(2),
  "core/design": upTo(3),
  "core/fit": upTo(4),
  "core/covariance": upTo(5),
  "core/diagnostics": upTo(6),
  "core/inference": upTo(6),
  "core/decision": [...upTo(6), "core/diagnostics", "core/inference"],
  "core/robustness": [...upTo(6), "core/diagnostics", "core/inference", "core/decision"],
  "core/answer": [...upTo(6), "core/diagnostics", "core/inference", "core/decision", "core/robustness"],
  "core/review": [...upTo(6), "core/diagnostics", "core/inference", "core/decision", "core/robustness", "core/answer"],
  sheet: ["core"],
  app: ["core", "sheet"],
  office: ["core", "sheet", "app"],
  functions: ["core", "sheet", "app"],
  taskpane: ["core", "sheet", "app"],
  worker: ["core", "sheet", "app"],
  desk: ["core/table/address.ts", "core/table/tableReference.ts", "sheet/sample/months.ts", "sheet/sample/draws.ts"],
  terminal: ["core", "sheet", "app", "office", "functions", "worker", "desk"],
  entries: ["core", "sheet", "app", "office", "functions", "taskpane", "worker", "desk", "terminal"],
};

function upTo(count: number): string[] {
  return core.slice(0, count).map((room) => `core/${room}`);
}

const files = readdirSync(src, { recursive: true, encoding: "utf8" })
  .filter((file) => /\.tsx?$/.test(file) && !file.endsWith(".d.ts"))
  .map((file) => file.replaceAll("\\", "/"));

const textOf = (file: string): string => readFileSync(join(src, file), "utf8");
const roomOf = (file: string): string =>
  file
    .split("/")
    .slice(0, file.startsWith("core/") ? 2 : 1)
    .join("/");

const specifiers = (file: string): string[] =>
  [...textOf(file).matchAll(/(?:from|import)\s*\(?\s*"([^"]+)"/g)].map((match) => match[1] ?? "");

const targets = (file: string): string[] =>
  specifiers(file)
    .filter((specifier) => specifier.startsWith(".") && !specifier.endsWith(".json"))
    .map((specifier) => relative(src, normalize(join(src, dirname(file), specifier))).replaceAll("\\", "/"));

/** What is left when files that need none of the rest, or that none of the rest needs, are taken away again and again. */
function inCircles(imports: ReadonlyMap<string, readonly string[]>): string[] {
  const needed = new Set([...imports.values()].flat());
  const left = [...imports].filter(([file, needs]) => needed.has(file) && needs.some((need) => imports.has(need)));
  return left.length === imports.size ? [...imports.keys()].sort() : inCircles(new Map(left));
}

describe("architecture", () => {
  it("finds the rooms it speaks of", () => {
    expect(new Set(files.map(roomOf))).toEqual(
      new Set(Object.keys(mayImport).filter((room) => files.some((file) => roomOf(file) === room))),
    );
    expect(files.length).toBeGreaterThan(100);
  });

  it("lets imports run one way only", () => {
    const wrong = files.flatMap((file) =>
      targets(file)
        .filter((target) => roomOf(target) !== roomOf(file))
        .filter(
          (target) => !(mayImport[roomOf(file)] ?? []).some((room) => target === room || target.startsWith(`${room}/`)),
        )
        .map((target) => `${file} imports ${target}`),
    );
    expect(wrong).toEqual([]);
  });

  it("goes in no circles: what two files need of each other stands in a third", () => {
    // Where a formula's cells are may hang on a number in it, and that number on cells: readers that call each other.
    const byNature = ["core/review/formula/numbersIn.ts", "core/review/formula/places.ts"];
    expect(inCircles(new Map(files.map((file) => [file, targets(file)])))).toEqual(byNature);
  });

  const only = (library: RegExp, rooms: readonly string[]): string[] =>
    files
      .filter((file) => specifiers(file).some((specifier) => library.test(specifier)))
      .filter((file) => !rooms.includes(roomOf(file)));

  it("keeps each library in its room", () => {
    expect(only(/^(ml-matrix|jstat)$/, ["core/numeric"])).toEqual([]);
    expect(only(/^(react|react-dom|@fluentui)/, ["taskpane", "entries", "desk"])).toEqual([]);
    expect(only(/^(@univerjs|hucre)/, ["desk"])).toEqual([]);
    expect(only(/^node:/, ["desk", "terminal", "entries"])).toEqual([]);
  });

  it("names Excel's object model in the office room alone", () => {
    const named = files.filter((file) => /\bExcel\.(run|Range|RequestContext|Worksheet)\b/.test(textOf(file)));
    expect(named.filter((file) => !["office", "desk"].includes(roomOf(file)))).toEqual([]);
  });

  it("keeps core free of clock, console, chance and browser", () => {
    const impure = /\b(console|document|window|performance)\.|Date\.now|new Date\(\)|Math\.random|\bfetch\(|setTimeout/;
    expect(files.filter((file) => file.startsWith("core/") && impure.test(textOf(file)))).toEqual([]);
  });

  it("catches only at the borders", () => {
    const borders = ["office", "functions", "worker", "desk", "terminal", "entries", "app", "taskpane"];
    // Whether a page may run WebAssembly shows itself only when it is tried.
    const elsewhere = ["core/numeric/vector/webAssembly.ts"];
    expect(
      files.filter((file) => /\bcatch\b\s*[({]/.test(textOf(file))).filter((file) => !borders.includes(roomOf(file))),
    ).toEqual(elsewhere);
  });

  it("has no file without an idea of its own: no barrels, no leftover names", () => {
    expect(files.filter((file) => /(^|\/)(index|utils?|helpers?|common)\.tsx?$/.test(file))).toEqual([]);
  });
});
