import type { Arena } from "./kernels.ts";
import { scalarArena } from "./scalar.ts";
import { vectorArena } from "./webAssembly.ts";

/** The arena of this machine, shared by all passes: what one leaves there the next may overwrite. */
export const arena: Arena = vectorArena() ?? scalarArena();
