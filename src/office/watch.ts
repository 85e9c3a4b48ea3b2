import type { Host } from "../app/host.ts";
import { type Result, failure, success } from "../core/problem/result.ts";
import { type SheetArea, addressOf, parseAddress } from "../core/table/address.ts";
import { type Rectangle, intersection } from "./areas.ts";
import type { ExcelClient } from "./client.ts";
import { unknownSheet } from "./locate.ts";
import { type SheetChange, changedArea, moved } from "./moved.ts";
import { inExcel } from "./session.ts";

type Watching = Awaited<ReturnType<Host["watch"]>>;

/** An editing user makes many changes in a row; half a second after the last of them is soon enough. */
const quietMilliseconds = 500;

/** Watches areas for changes; the areas follow rows and columns that are put in or taken out. */
export async function watch(
  client: ExcelClient,
  addresses: readonly string[],
  changed: (address: string) => void,
): Promise<Watching> {
  const areas = addresses.map(parseAddress);
  const bad = addresses.find((_, index) => areas[index] === null);
  if (bad !== undefined) return failure({ code: "bad-address", address: bad });
  const watched = areas.filter((area) => area !== null);
  const teller = quietTeller(changed);
  const stops: Stop[] = [];
  const stopAll: Stop = async (context) => {
    teller.silence();
    for (const stop of stops) await stop(context);
  };
  return inExcel(client, async (context): Promise<Watching> => {
    for (const name of new Set(watched.map(({ sheet }) => sheet))) {
      const mine = watched.filter(({ sheet }) => sheet === name);
      const stop = await listen(context, name, follower(mine, teller.tell));
      if (!stop.ok) {
        await stopAll(context);
        return stop;
      }
      stops.push(stop.value);
    }
    // Handlers are taken back in the context that they were added in.
    return success(() => client.run(context, stopAll));
  });
}

type Stop = (context: Excel.RequestContext) => Promise<void>;

/** Hears of cells that were edited and of formulas that came to another value, until told to stop. */
async function listen(
  context: Excel.RequestContext,
  name: string,
  hear: (change: SheetChange) => void,
): Promise<Result<Stop>> {
  const sheet = context.workbook.worksheets.getItemOrNullObject(name);
  sheet.load("id");
  await context.sync();
  if (sheet.isNullObject) return unknownSheet(context, name);
  const hearAll = (kind: string, addresses: string): Promise<void> => {
    for (const address of addresses.split(",")) hear({ kind, area: changedArea(address) });
    return Promise.resolve();
  };
  const edited = sheet.onChanged.add(({ address, changeType }) => hearAll(changeType, address));
  const calculated = sheet.onCalculated.add(({ address }) => hearAll("Calculated", address));
  await context.sync();
  return success(async (stopping) => {
    edited.remove();
    calculated.remove();
    await stopping.sync();
  });
}

/** Keeps where the areas of one sheet stand now, and tells of each that a change touched. */
function follower(watched: readonly SheetArea[], tell: Teller["tell"]): (change: SheetChange) => void {
  let areas: readonly { readonly at: Rectangle | null; readonly last: SheetArea }[] = watched.map((area) => ({
    at: area,
    last: area,
  }));
  return (change) => {
    areas = areas.map(({ at, last }) => {
      if (at === null) return { at, last };
      const { area, touched } = moved(at, change);
      const now = { ...last, ...area };
      if (touched) tell(last, addressOf({ ...now, ...touchedPart(now, change) }));
      return { at: area, last: now };
    });
  };
}

/** The cells that were edited, or came to another value; where cells were put in or taken out, the whole area. */
const touchedPart = (area: SheetArea, { kind, area: change }: SheetChange): Rectangle =>
  (kind === "RangeEdited" || kind === "Calculated" ? intersection(area, change) : null) ?? area;

interface Teller {
  /** Of several changes of an area the first is told. */
  readonly tell: (area: SheetArea, address: string) => void;
  readonly silence: () => void;
}

/** Tells of each area once, when no further change has come for a while. */
function quietTeller(changed: (address: string) => void): Teller {
  const addresses = new Map<string, string>();
  let timer: ReturnType<typeof setTimeout> | undefined;
  let silent = false;
  const speak = (): void => {
    const told = [...addresses.values()];
    addresses.clear();
    for (const address of told) changed(address);
  };
  return {
    tell: (area, address) => {
      if (silent) return;
      const key = addressOf(area);
      if (!addresses.has(key)) addresses.set(key, address);
      clearTimeout(timer);
      timer = setTimeout(speak, quietMilliseconds);
    },
    silence: () => {
      silent = true;
      clearTimeout(timer);
    },
  };
}
