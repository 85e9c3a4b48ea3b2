import { useEffect, useRef, useState, type CSSProperties, type ReactNode } from "react";
import type { BookData } from "../book/bookData.ts";
import { demoBook } from "../demo/demoBook.ts";
import type { FunctionsMetadata } from "../workbook/metadata.ts";
import { bookName, downloadCsv, downloadForExcel, downloadForLibreOffice, readBook } from "./bookFiles.ts";
import { DeskBar } from "./DeskBar.tsx";
import { cannotRead, openedNote, savedForLibreOffice, type Note } from "./notes.ts";
import { useParts } from "./parts.ts";
import { openSession, type Session } from "./session.ts";
import { Splitter } from "./Splitter.tsx";

interface Opened {
  readonly name: string;
  readonly book: BookData;
}

const demo = (): Opened => ({ name: "Kestrel & Vane", book: demoBook() });

/** In pixels; no pane of Excel's is narrower. */
const usualPaneWidth = 400;

/** How wide the pane is, for the style sheet. */
const paneIs = (width: number): CSSProperties => ({ "--pane-width": `${width}px` }) as CSSProperties;

/** The stand-in spreadsheet: a bar of its own, the cells, and the add-in's pane beside them. */
export function DeskPage({ functions }: { readonly functions: FunctionsMetadata }): ReactNode {
  const [opened, setOpened] = useState(demo);
  const [note, setNote] = useState<Note | null>(null);
  const [paneWidth, setPaneWidth] = useState(usualPaneWidth);
  const parts = useParts();
  const session = useSession(parts, opened, functions);
  const open = async (file: File): Promise<void> => {
    const reading = await readBook(file);
    if (reading.ok) setOpened({ name: bookName(file.name), book: reading.value });
    setNote(reading.ok ? openedNote(reading.value.loosened) : cannotRead(file.name, reading.because));
  };
  const withBook = (use: (book: BookData) => unknown) => (): void => {
    setNote(null);
    if (session.current !== null) use(session.current.desk.snapshot());
  };
  const saveForLibreOffice = async (book: BookData): Promise<void> =>
    setNote(savedForLibreOffice(await downloadForLibreOffice(book, opened.name)));
  return (
    <div className="desk" style={paneIs(paneWidth)}>
      <DeskBar
        name={opened.name}
        note={note}
        bar={parts.bar}
        openDemo={() => setOpened(demo())}
        open={(file) => void open(file)}
        saveForExcel={withBook((book) => downloadForExcel(book, opened.name))}
        saveForLibreOffice={withBook((book) => void saveForLibreOffice(book))}
        saveSheet={withBook(downloadCsv)}
        goToGrid={parts.goToGrid}
        goToPane={parts.goToPane}
      />
      <main className="grid" aria-label="Sheet" ref={parts.grid} />
      <aside className="side" aria-label="Add-in">
        <Splitter width={paneWidth} resize={setPaneWidth} />
        <iframe className="pane" title="Footing" ref={parts.pane} />
      </aside>
    </div>
  );
}

function useSession(parts: ReturnType<typeof useParts>, { book }: Opened, functions: FunctionsMetadata) {
  const session = useRef<Session>(null);
  useEffect(() => {
    const [grid, pane] = [parts.grid.current, parts.pane.current];
    if (grid === null || pane === null) return;
    const started = openSession({ grid, pane }, book, functions);
    session.current = started;
    parts.attend(started.desk.book.grid);
    // For the browser's console and for tests: the desk as a person's hands have it.
    Object.assign(globalThis, { desk: started.desk });
    return () => {
      session.current = null;
      started.close();
    };
  }, [parts, book, functions]);
  return session;
}
