/** How text travels between an add-in's runtime and its host. In Node they share a process; in a browser, a frame's edge lies between. */
export interface Transport {
  readonly send: (text: string) => void;
  /** One receiver at a time; set before the first message is sent. */
  readonly receive: (receiver: (text: string) => void) => void;
}

/** Two ends of a line within one process. Messages arrive in order and never while the sender is still at work. */
export function joinedTransports(): { readonly client: Transport; readonly host: Transport } {
  const [toHost, toClient] = [mailbox(), mailbox()];
  return {
    client: { send: toHost.put, receive: toClient.take },
    host: { send: toClient.put, receive: toHost.take },
  };
}

function mailbox(): {
  readonly put: (text: string) => void;
  readonly take: (receiver: (text: string) => void) => void;
} {
  let receiver: (text: string) => void = () => undefined;
  return {
    put: (text) => queueMicrotask(() => receiver(text)),
    take: (wanted) => {
      receiver = wanted;
    },
  };
}
