import { startNodeGrid } from "../workbook/nodeGrid.ts";
import { startDesk, type Desk, type DeskOptions } from "./desk.ts";
import { lightTheme } from "./loader.ts";
import { loadNodeClient, type Client } from "./nodeClient.ts";
import { joinedTransports } from "./transport.ts";

/** The desk without a screen, with the add-in's globals at hand. */
export interface NodeDesk extends Desk, Client {
  /** Lays Excel, Office and CustomFunctions out as globals; answers with a way to take them back. */
  readonly asGlobals: () => () => void;
  readonly close: () => void;
}

export async function openDesk(options: DeskOptions): Promise<NodeDesk> {
  const grid = await startNodeGrid();
  const line = joinedTransports();
  const platform = options.profile === "web" ? "OfficeOnline" : "PC";
  const { Excel, Office, CustomFunctions } = await loadNodeClient(line.client, { theme: lightTheme, platform });
  const client = { Excel, Office, CustomFunctions };
  const desk = startDesk(grid, line.host, options);
  return {
    ...desk,
    ...client,
    asGlobals: () => layOut(client),
    close: () => {
      desk.stop();
      grid.dispose();
    },
  };
}

function layOut(client: Client): () => void {
  const globals = globalThis as unknown as Record<string, unknown>;
  const before = Object.keys(client).map((name) => [name, globals[name]] as const);
  Object.assign(globals, client);
  return () => {
    for (const [name, value] of before) {
      if (value === undefined) Reflect.deleteProperty(globals, name);
      else globals[name] = value;
    }
  };
}
