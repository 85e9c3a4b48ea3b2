import { type ReactNode, StrictMode } from "react";
import { createRoot } from "react-dom/client";
import packageFile from "../../package.json" with { type: "json" };
import { detailsOf } from "../app/faultDetails.ts";
import { createPane } from "../app/pane.ts";
import { listedFunctions } from "../functions/listed.ts";
import { pageClient } from "../office/client.ts";
import { excelHost } from "../office/excelHost.ts";
import { floor } from "../office/session.ts";
import { Outside, type WhyOutside } from "../taskpane/Outside.tsx";
import { PaneApp } from "../taskpane/PaneApp.tsx";
import { lateComputing } from "../worker/lateComputing.ts";
import type { WorkerLine } from "../worker/protocol.ts";
import { workerAnalyst } from "../worker/workerAnalyst.ts";

const hire = (): WorkerLine =>
  new Worker(/* webpackChunkName: "worker" */ new URL("./worker.ts", import.meta.url)) as WorkerLine;

const day = new Intl.DateTimeFormat("en-GB", { dateStyle: "long" });

/** Longer than this, and no host will answer: the page was opened in a browser of its own. */
const patienceMs = 15_000;

const pane = createPane({
  host: excelHost(),
  analyst: workerAnalyst({ hire, fallback: lateComputing, seconds: 600 }),
  edition: { today: () => day.format(new Date()), version: packageFile.version },
  guard: (work) => void work().catch(showFault),
});

function showFault(fault: unknown): void {
  pane.store.dispatch({ kind: "failed", fault: { kind: "bug", details: detailsOf(fault) } });
}

/** Hosts differ: some tell outright, some give the colour of the pane's ground, some tell nothing. */
function hostIsDark(): boolean | null {
  const theme = hostScript()?.context?.officeTheme;
  return theme?.isDarkTheme ?? null;
}

/** The host's script may be missing, and parts of it come late; its types promise more than that. */
const hostScript = () => globalThis.Office as { readonly context?: { readonly officeTheme?: Theme } } | undefined;

interface Theme {
  readonly isDarkTheme?: boolean;
}

const element = document.getElementById("pane");
if (element === null) throw new Error("The page has no place for the pane.");
const root = createRoot(element);
const show = (what: ReactNode): void => root.render(<StrictMode>{what}</StrictMode>);

show(<Outside why={{ kind: "waiting" }} hostIsDark={hostIsDark} />);
const giveUp = setTimeout(() => show(<Outside why={{ kind: "no host" }} hostIsDark={hostIsDark} />), patienceMs);

function meetHost(host: Office.HostType | null): void {
  clearTimeout(giveUp);
  const why = whyOutside(host);
  show(
    why === null ? (
      <PaneApp pane={pane} hostIsDark={hostIsDark} functions={listedFunctions} />
    ) : (
      <Outside why={why} hostIsDark={hostIsDark} />
    ),
  );
}

/** null where Excel answers and has what is used. */
function whyOutside(host: Office.HostType | null): WhyOutside | null {
  if (host !== Office.HostType.Excel) return { kind: "no host" };
  const { set, version: least } = floor;
  return pageClient.isSetSupported(set, least) ? null : { kind: "too old", missing: `${set} ${least}` };
}

if (hostScript() === undefined) show(<Outside why={{ kind: "no host" }} hostIsDark={hostIsDark} />);
else void Office.onReady(({ host }) => meetHost(host));
