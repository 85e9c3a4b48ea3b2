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
  script.runInContext(createContext(globals));
  return globals as unknown as Client;
}

async function compile(): Promise<Script> {
  const path = createRequire(import.meta.url).resolve(library);
  return new Script(await readFile(path, "utf8"), { filename: path });
}

/** The little of a page that the library looks at, and the objects it must share with the code that calls it. */
function pageGlobals(): Globals {
  const shared = {
    console,
    setTimeout,
    clearTimeout,
    performance,
    Promise,
    JSON,
    Math,
    Date,
    Object,
    Array,
    String,
    Number,
  };
  const more = {
    Boolean,
    Error,
    TypeError,
    RegExp,
    Symbol,
    Function,
    Map,
    Set,
    Uint8Array,
    parseInt,
    parseFloat,
    isNaN,
    isFinite,
  };
  const text = { encodeURIComponent, decodeURIComponent, escape, unescape };
  const nothing = (): undefined => undefined;
  const element = { setAttribute: nothing, style: {} };
  const document = {
    createElement: () => element,
    getElementsByTagName: () => [],
    addEventListener: nothing,
    cookie: "",
    readyState: "complete",
  };
  const page = { navigator: { userAgent: "desk" }, location: { href: "https://localhost/" }, document };
  const globals: Globals = { ...shared, ...more, ...text, ...page, addEventListener: nothing };
  globals["window"] = globals["self"] = globals["global"] = globals;
  return globals;
}
