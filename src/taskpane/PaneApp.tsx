import { FluentProvider } from "@fluentui/react-components";
import { type ReactNode, useEffect, useMemo, useSyncExternalStore } from "react";
import type { Pane } from "../app/pane.ts";
import { FaultBoundary } from "./FaultBoundary.tsx";
import { Shell } from "./Shell.tsx";
import { usePage } from "./look/page.ts";
import { themeFor } from "./look/theme.ts";
import { type HostIsDark, useDark } from "./look/useDark.ts";
import { type ListedFunction, PaneContext } from "./paneContext.ts";

export interface PaneAppProps {
  readonly pane: Pane;
  readonly hostIsDark: HostIsDark;
  readonly functions: readonly ListedFunction[];
}

/** The whole pane: what the state says, in the host's theme. */
export function PaneApp({ pane, hostIsDark, functions }: PaneAppProps): ReactNode {
  usePage();
  const { store, commands } = pane;
  const dark = useDark(hostIsDark);
  const state = useSyncExternalStore(store.subscribe, store.get);
  const view = useMemo(
    () => ({ state, dispatch: store.dispatch, commands, functions }),
    [state, store, commands, functions],
  );
  useEffect(commands.open, [commands]);
  return (
    <FluentProvider theme={themeFor(dark)}>
      <FaultBoundary>
        <PaneContext value={view}>
          <Shell />
        </PaneContext>
      </FaultBoundary>
    </FluentProvider>
  );
}
