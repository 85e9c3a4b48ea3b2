import { type RefObject, useEffect, useLayoutEffect, useRef } from "react";

/**
 * Keeps the focus inside the pane: the title of the section takes it when the user is brought to a section, and where
 * the control that had it has gone.
 * @param arrivals - counts how often the user was brought to a section.
 */
export function useKeptFocus(root: RefObject<HTMLElement | null>, arrivals: number): void {
  const last = useRef<Element | null>(null);
  const toTitle = (): void => root.current?.querySelector<HTMLElement>("[data-section-title]")?.focus();
  useEffect(() => {
    const remember = ({ target }: FocusEvent): void => {
      last.current = target instanceof Element ? target : null;
    };
    const area = root.current;
    area?.addEventListener("focusin", remember);
    return () => area?.removeEventListener("focusin", remember);
  }, [root]);
  useLayoutEffect(() => {
    const gone = last.current !== null && !last.current.isConnected;
    if (gone && document.activeElement === document.body) toTitle();
  });
  useEffect(() => {
    if (arrivals > 0) toTitle();
  }, [arrivals]);
}
