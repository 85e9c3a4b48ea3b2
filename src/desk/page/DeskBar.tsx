import { useRef, type ReactNode, type RefObject } from "react";
import type { Note } from "./notes.ts";

export interface DeskBarProps {
  /** Of the workbook. */
  readonly name: string;
  /** What is to be said of what was done last. */
  readonly note: Note | null;
  readonly bar: RefObject<HTMLElement | null>;
  readonly openDemo: () => void;
  readonly open: (file: File) => void;
  readonly saveForExcel: () => void;
  readonly saveForLibreOffice: () => void;
  readonly saveSheet: () => void;
  readonly goToGrid: () => void;
  readonly goToPane: () => void;
}

/** Files in and out, and the ways to the other parts of the page. */
export function DeskBar(props: DeskBarProps): ReactNode {
  const file = useRef<HTMLInputElement>(null);
  return (
    <header className="bar" ref={props.bar}>
      <h1>
        The desk <span className="book-name">{props.name}</span>
      </h1>
      <nav aria-label="Workbook">
        <Command name="Open..." run={() => file.current?.click()} />
        <Command name="Save for Excel" run={props.saveForExcel} />
        <Command name="Save for LibreOffice" run={props.saveForLibreOffice} />
        <Command name="Save sheet as CSV" run={props.saveSheet} />
        <Command name="Demo workbook" run={props.openDemo} />
      </nav>
      <nav aria-label="Parts of the page">
        <Command name="To the sheet" run={props.goToGrid} />
        <Command name="To the pane" run={props.goToPane} />
        <span className="hint">or F6</span>
      </nav>
      <p role="alert">{textOf(props.note, "fault")}</p>
      <p role="status">{textOf(props.note, "word")}</p>
      <input
        ref={file}
        type="file"
        hidden
        accept=".xlsx,.xlsm,.csv,.tsv,.txt"
        aria-label="File to open"
        onChange={(event) => pass(event.target, props.open)}
      />
    </header>
  );
}

const textOf = (note: Note | null, kind: Note["kind"]): string => (note?.kind === kind ? note.text : "");

/** Hands on the file that was chosen; the same one may be chosen again. */
function pass(input: HTMLInputElement, open: (file: File) => void): void {
  const file = input.files?.[0];
  if (file !== undefined) open(file);
  input.value = "";
}

const Command = ({ name, run }: { readonly name: string; readonly run: () => void }): ReactNode => (
  <button type="button" onClick={run}>
    {name}
  </button>
);
