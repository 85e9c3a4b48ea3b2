/** What the pane's frame says to the page around when its reader presses F6, and where that leads. */
export const wishes = { onward: "footing desk: next part", back: "footing desk: part before" } as const;

/** In the frame: F6 belongs to the page around, as it belongs to Excel, and is not passed to the add-in. */
export function passPartKey(page: Window, origin: string): void {
  window.addEventListener(
    "keydown",
    (event) => {
      if (event.key !== "F6") return;
      event.preventDefault();
      event.stopImmediatePropagation();
      page.postMessage(event.shiftKey ? wishes.back : wishes.onward, origin);
    },
    true,
  );
}
