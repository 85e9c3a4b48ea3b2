import { useEffect, useState } from "react";

/** Whether the host is dark, asked anew each time; null where it does not say. */
export type HostIsDark = () => boolean | null;

/**
 * Whether the pane is to be dark: as the host says, else as the system prefers. Hosts tell no one when their theme
 * changes, so it is asked again whenever the user comes back to the pane.
 */
export function useDark(hostIsDark: HostIsDark): boolean {
  const [dark, setDark] = useState(() => isDark(hostIsDark));
  useEffect(() => {
    const look = (): void => setDark(isDark(hostIsDark));
    const preference = matchMedia(prefersDark);
    preference.addEventListener("change", look);
    window.addEventListener("focus", look);
    document.addEventListener("visibilitychange", look);
    return () => {
      preference.removeEventListener("change", look);
      window.removeEventListener("focus", look);
      document.removeEventListener("visibilitychange", look);
    };
  }, [hostIsDark]);
  return dark;
}

const prefersDark = "(prefers-color-scheme: dark)";

const isDark = (hostIsDark: HostIsDark): boolean => hostIsDark() ?? matchMedia(prefersDark).matches;
