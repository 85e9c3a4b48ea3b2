import type { Host } from "../../src/app/host.ts";
import type { BookData } from "../../src/desk/book/bookData.ts";
import { type NodeDesk, openDesk } from "../../src/desk/client/openDesk.ts";
import { functionsMetadata } from "../../src/functions/metadata.ts";
import { excelHost } from "../../src/office/excelHost.ts";

export interface DeskHost {
  readonly desk: NodeDesk;
  readonly host: Host;
}

/** The adapter over the vendor's own client, with the stand-in spreadsheet behind it. */
export async function openDeskHost(
  book: BookData,
  options: Partial<Parameters<typeof openDesk>[0]> = {},
): Promise<DeskHost> {
  const desk = await openDesk({ book, functions: functionsMetadata(), ...options });
  await desk.Office.onReady();
  const { requirements } = desk.Office.context;
  const host = excelHost({
    run: desk.Excel.run,
    isSetSupported: (set, version) => requirements.isSetSupported(set, version),
  });
  return { desk, host };
}

export const errand = (
  signal = new AbortController().signal,
  progress: (share: number | null) => void = () => undefined,
) => ({
  signal,
  progress: ({ share }: { readonly share: number | null }) => progress(share),
});
