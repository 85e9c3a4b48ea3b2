import { readFile } from "node:fs/promises";
import { createRequire } from "node:module";
import { createContext, Script } from "node:vm";
import { installLoader, type Globals, type Surroundings } from "./loader.ts";
import type { Transport } from "./transport.ts";

/** What an add-in finds as globals in a page: the vendor's API, the loader's part of it, the functions' registry. */
export interface Client {
  readonly Excel: typeof Excel;
  readonly Office: typeof Office;
  readonly CustomFunctions: typeof CustomFunctions;
}

const library = "@microsoft/office-js/dist/excel-win32-16.01.debug.js";

let compiled: Promise<Script> | null = null;

/** Runs the vendor's unmodified client library in a page of its own: the built-in objects stay those of this process. */
export async function loadNodeClient(transport: Transport, surroundings: Surroundings): Promise<Client> {
  compiled ??= compile();
  const script = await compiled;
  const globals = pageGlobals();
  installLoader(globals, transport, surroundings);
  const loaded = globals["Office"];
  script.runInContext(createContext(globals));
  // The library lays its own Office object over the loader's, without the context that only the loader knows.
  globals["Office"] = loaded;
  return globals as unknown as Client;
}

async function compile(): Promise<Script> {
  const path = createRequire(import.meta.url).resolve(library);
  return new Script(await readFile(path, "utf8"), { filename: path });
}

/** Built-in objects that the library must share with the code that calls it: an array of one is an array of the other. */
const shared: Globals = {
  Array,
  Boolean,
  Date,
  Error,
  Function,
  JSON,
  Map,
  Math,
  Number,
  Object,
  Promise,
  RegExp,
  Set,
  String,
  Symbol,
  TypeError,
  Uint8Array,
  clearTimeout,
  console,
  decodeURIComponent,
  encodeURIComponent,
  isFinite,
  isNaN,
  parseFloat,
  parseInt,
  performance,
  setTimeout,
};

/** The little of a page that the library looks at. */
function pageGlobals(): Globals {
  const nothing = (): undefined => undefined;
  const document = {
    createElement: () => ({ setAttribute: nothing, style: {} }),
    getElementsByTagName: () => [],
    addEventListener: nothing,
    cookie: "",
    readyState: "complete",
  };
  const page = { navigator: { userAgent: "desk" }, location: { href: "https://localhost/" }, document };
  const globals: Globals = { ...shared, ...page, addEventListener: nothing };
  globals["window"] = globals["self"] = globals["global"] = globals;
  return globals;
}
