/** Numbers of the client's events. */
export const eventKind = {
  /** Workbook.onSelectionChanged, an older kind: the client registers for it with itself alone. */
  workbookSelected: 2,
  changed: 10,
  activated: 11,
  deactivated: 12,
  added: 13,
  selected: 14,
  deleted: 15,
  calculated: 16,
  tableChanged: 101,
} as const;

/** The target of events that concern the whole workbook. */
export const wholeWorkbook = "Workbook";

export interface HostEvent {
  readonly kind: number;
  readonly target: string;
  readonly details: Readonly<Record<string, unknown>>;
}

/** Who listens to what. A registration counts from the end of the request that made it. */
export interface Events {
  readonly register: (kind: number, target: string) => void;
  readonly unregister: (kind: number, target: string) => void;
  /** The request that registered is over. */
  readonly settle: () => void;
  readonly raise: (event: HostEvent) => void;
  /** Sends an event that nobody registers for with the host. */
  readonly broadcast: (event: HostEvent) => void;
  enabled: boolean;
}

export function startEvents(deliver: (event: HostEvent) => void): Events {
  const heard = new Map<string, number>();
  let asked: string[] = [];
  const key = (kind: number, target: string): string => `${kind} ${target}`;
  return {
    enabled: true,
    register: (kind, target) => asked.push(key(kind, target)),
    unregister: (kind, target) => {
      const left = (heard.get(key(kind, target)) ?? 0) - 1;
      if (left > 0) heard.set(key(kind, target), left);
      else heard.delete(key(kind, target));
    },
    settle: () => {
      for (const one of asked) heard.set(one, (heard.get(one) ?? 0) + 1);
      asked = [];
    },
    raise(event) {
      if (this.enabled && heard.has(key(event.kind, event.target))) deliver(event);
    },
    broadcast(event) {
      if (this.enabled) deliver(event);
    },
  };
}
