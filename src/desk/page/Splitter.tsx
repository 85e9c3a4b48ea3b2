import type { KeyboardEvent, PointerEvent, ReactNode } from "react";

export interface SplitterProps {
  /** Of the pane, in pixels. */
  readonly width: number;
  readonly resize: (width: number) => void;
}

const narrowest = 320;
const widest = 900;
const step = 20;

const within = (width: number): number => Math.min(widest, Math.max(narrowest, Math.round(width)));

/** The edge between sheet and pane: dragged, or moved with the arrow keys. */
export function Splitter({ width, resize }: SplitterProps): ReactNode {
  const drag = ({ currentTarget, pointerId, clientX }: PointerEvent<HTMLElement>): void => {
    if (currentTarget.hasPointerCapture(pointerId)) resize(within(window.innerWidth - clientX));
  };
  const move = ({ key }: KeyboardEvent): void => {
    if (key === "ArrowLeft") resize(within(width + step));
    if (key === "ArrowRight") resize(within(width - step));
  };
  return (
    <div
      className="splitter"
      role="separator"
      aria-label="Width of the pane"
      aria-orientation="vertical"
      aria-valuemin={narrowest}
      aria-valuemax={widest}
      aria-valuenow={width}
      tabIndex={0}
      onPointerDown={(event) => event.currentTarget.setPointerCapture(event.pointerId)}
      onPointerMove={drag}
      onKeyDown={move}
    />
  );
}
