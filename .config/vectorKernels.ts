/**
 * Compiles src/core/numeric/vector/kernels.as and writes it, in base64, to vectorModule.ts beside it:
 * npx tsx .config/vectorKernels.ts
 */
import { readFileSync, writeFileSync } from "node:fs";
import { fileURLToPath } from "node:url";

/** What is used of the compiler; its own types would change those of the built-in arrays in the whole project. */
interface Compiler {
  readonly main: (
    given: readonly string[],
    files: {
      readonly readFile: (name: string) => string | null;
      readonly writeFile: (name: string, contents: string | Uint8Array) => void;
      readonly listFiles: () => readonly string[];
    },
  ) => Promise<{ readonly error: Error | null; readonly stderr: { toString(): string } }>;
}

const folder = new URL("../src/core/numeric/vector/", import.meta.url);

/** The module that the source stands for, in base64. */
export async function compiledKernels(): Promise<string> {
  const source = readFileSync(new URL("kernels.as", folder), "utf8");
  const compiler = "assemblyscript/asc";
  const { main } = (await import(compiler)) as Compiler;
  let binary: Uint8Array | null = null;
  const options = [
    "-O3",
    "--runtime",
    "stub",
    "--noAssert",
    "--importMemory",
    "--enable",
    "simd",
    "-o",
    "kernels.wasm",
  ];
  const { error, stderr } = await main(["kernels.ts", ...options], {
    readFile: (name) => (name === "kernels.ts" ? source : null),
    writeFile: (_, contents) => {
      if (typeof contents !== "string") binary = contents;
    },
    listFiles: () => [],
  });
  if (error !== null || binary === null) throw new Error(stderr.toString());
  return Buffer.from(binary).toString("base64");
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  const lines = (await compiledKernels()).match(/.{1,110}/g) ?? [];
  const text = [
    "/** The kernels of kernels.as as WebAssembly, written by .config/vectorKernels.ts. */",
    "export const vectorModule = [",
    ...lines.map((line) => `  "${line}",`),
    '].join("");',
  ];
  writeFileSync(new URL("vectorModule.ts", folder), `${text.join("\n")}\n`);
}
