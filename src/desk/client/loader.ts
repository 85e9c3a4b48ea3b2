import { deliverCalls, holdsCalls } from "./deliverCalls.ts";
import { messageType } from "./messages.ts";
import { isSetSupported } from "./requirementSets.ts";
import type { Transport } from "./transport.ts";

/** What the host tells of itself before anything is asked. */
export interface Surroundings {
  readonly theme: OfficeTheme;
  readonly platform: "PC" | "OfficeOnline";
  readonly isSetSupported?: (name: string, version?: string | number) => boolean;
}

export interface OfficeTheme {
  readonly isDarkTheme: boolean;
  readonly bodyBackgroundColor: string;
  readonly bodyForegroundColor: string;
  readonly controlBackgroundColor: string;
  readonly controlForegroundColor: string;
}

export const lightTheme: OfficeTheme = {
  isDarkTheme: false,
  bodyBackgroundColor: "#ffffff",
  bodyForegroundColor: "#242424",
  controlBackgroundColor: "#f5f5f5",
  controlForegroundColor: "#242424",
};

export const darkTheme: OfficeTheme = {
  isDarkTheme: true,
  bodyBackgroundColor: "#292929",
  bodyForegroundColor: "#ffffff",
  controlBackgroundColor: "#1f1f1f",
  controlForegroundColor: "#ffffff",
};

interface HostInfo {
  readonly host: "Excel";
  readonly platform: Surroundings["platform"];
}

/** The door that the client library has for hosts which speak to it in text. */
interface Bridge {
  readonly sendMessageToHost: (text: string) => void;
  onMessageFromHost?: (text: string) => void;
}

/** A page's global object, or what stands for one in Node. */
export type Globals = Record<string, unknown>;

/**
 * Stands for the loader, office.js, alone: it says who the host is and lays the line. The library that the real
 * loader would fetch is run after it, unmodified.
 */
export function installLoader(globals: Globals, transport: Transport, surroundings: Surroundings): void {
  const bridge: Bridge = { sendMessageToHost: transport.send };
  transport.receive((text) => {
    if (holdsCalls(text)) deliverCalls(text, distributorOf(globals));
    else bridge.onMessageFromHost?.(text);
  });
  globals["_richApiNativeBridge"] = bridge;
  const ready = once(() => transport.send(JSON.stringify({ type: messageType.ready })));
  globals["CustomFunctions"] = association(ready);
  globals["Office"] = office(surroundings, ready);
}

/** There once the library has run, which is before the add-in says that it is ready for calls. */
const distributorOf = (globals: Globals): Parameters<typeof deliverCalls>[1] =>
  (globals["OfficeExtension"] as { HostBridge: { instance: Parameters<typeof deliverCalls>[1] } }).HostBridge.instance;

/** An add-in shows itself by its first word; what it says in the same breath belongs to it. */
function once(work: () => void): () => void {
  let due = true;
  return () => {
    if (due) setTimeout(work, 0);
    due = false;
  };
}

function office(surroundings: Surroundings, asked: () => void): object {
  const { theme, platform, isSetSupported: supports = isSetSupported } = surroundings;
  const info: HostInfo = { host: "Excel", platform };
  const ready = Promise.resolve(info);
  return {
    HostType: { Excel: "Excel" },
    PlatformType: { PC: "PC", OfficeOnline: "OfficeOnline" },
    EventType: {},
    onReady: async (callback?: (info: HostInfo) => unknown) => {
      asked();
      const known = await ready;
      await callback?.(known);
      return known;
    },
    context: {
      host: info.host,
      platform,
      officeTheme: theme,
      contentLanguage: "en-US",
      displayLanguage: "en-US",
      partitionKey: "desk",
      diagnostics: { host: info.host, platform, version: "16.0.18000.20000" },
      requirements: { isSetSupported: (name: string, version?: string | number) => supports(name, version) },
    },
    actions: { associate: () => undefined },
  };
}

/** Functions by the ids of the metadata; the runtime looks them up without regard to case. */
function association(added: () => void): object {
  const mappings: Record<string, unknown> = {};
  const listeners: (() => void)[] = [];
  const set = (id: string, work: unknown): void => {
    mappings[id.toUpperCase()] = work;
    added();
    for (const listener of listeners) listener();
  };
  const associate = (first: string | Readonly<Record<string, unknown>>, work?: unknown): void => {
    if (typeof first === "string") set(first, work);
    else for (const [id, one] of Object.entries(first)) set(id, one);
  };
  const onchange = (listener: () => void): void => {
    listeners.push(listener);
  };
  return { associate, _association: { mappings, associate, onchange } };
}
