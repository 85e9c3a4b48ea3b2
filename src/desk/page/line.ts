import type { Transport } from "../client/transport.ts";

/** What the add-in's frame says to the page around it to be given a line, with its end of a channel. */
const call = "footing desk: line";

/** The frame's end: opens a channel and hands the other end to the page around. */
export function lineToPage(page: Window, origin: string): Transport {
  const { port1, port2 } = new MessageChannel();
  page.postMessage(call, origin, [port2]);
  return {
    send: (text) => port1.postMessage(text),
    receive: (receiver) => {
      port1.onmessage = ({ data }: MessageEvent<string>) => receiver(data);
    },
  };
}

/** The page's end. What is sent before the frame has called waits; a frame that loads anew calls anew. */
export function lineToFrame(frame: HTMLIFrameElement): Transport & { readonly close: () => void } {
  const waiting: string[] = [];
  let port: MessagePort | null = null;
  let receiver: (text: string) => void = () => undefined;
  const answer = ({ data, source, ports }: MessageEvent): void => {
    if (data !== call || source !== frame.contentWindow) return;
    port?.close();
    port = ports[0] ?? null;
    if (port !== null) port.onmessage = (message: MessageEvent<string>) => receiver(message.data);
    for (const text of waiting.splice(0)) port?.postMessage(text);
  };
  window.addEventListener("message", answer);
  return {
    send: (text) => (port === null ? void waiting.push(text) : port.postMessage(text)),
    receive: (wanted) => {
      receiver = wanted;
    },
    close: () => {
      window.removeEventListener("message", answer);
      port?.close();
    },
  };
}
