import { createReadStream, existsSync, statSync } from "node:fs";
import { createServer } from "node:http";
import type { AddressInfo } from "node:net";
import { extname, join, normalize } from "node:path";

const root = join(import.meta.dirname, "../../..");
const built = join(root, "dist");
/** Excel's client library stays where it was installed: it is served, never copied. */
const library = join(root, "node_modules/@microsoft/office-js/dist");

const types: Readonly<Record<string, string>> = {
  ".html": "text/html; charset=utf-8",
  ".js": "text/javascript; charset=utf-8",
  ".json": "application/json",
  ".png": "image/png",
  ".xml": "text/xml",
};

export interface Site {
  /** "http://127.0.0.1:41234" */
  readonly address: string;
  readonly close: () => Promise<void>;
}

/** Serves what `npm run build` made, as the development server does. */
export async function startSite(): Promise<Site> {
  if (!existsSync(join(built, "desk/index.html"))) throw new Error("Nothing is built yet: run `npm run build` first.");
  const server = createServer((request, response) => {
    const path = fileFor(new URL(request.url ?? "/", "http://localhost").pathname);
    if (path === null) return void response.writeHead(404).end();
    response.writeHead(200, { "Content-Type": types[extname(path)] ?? "application/octet-stream" });
    createReadStream(path).pipe(response);
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const { port } = server.address() as AddressInfo;
  return {
    address: `http://127.0.0.1:${port}`,
    close: () => new Promise((resolve) => server.close(() => resolve())),
  };
}

const vendor = "/desk/vendor/";

function fileFor(pathname: string): string | null {
  const inside = normalize(decodeURIComponent(pathname));
  const path = inside.startsWith(vendor) ? join(library, inside.slice(vendor.length)) : join(built, inside);
  const file = path.endsWith("/") ? join(path, "index.html") : path;
  return existsSync(file) && statSync(file).isFile() ? file : null;
}
