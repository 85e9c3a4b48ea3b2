/** The first port tried; the next free one is taken where it is in use. */
const firstPort = "3000";

/**
 * Serves the desk at /desk/, the add-in beside it, and Excel's client library from its package:
 * the library's licence allows it for developing and testing, so it is served from where it was installed and never copied.
 */
export function deskServer(at) {
  process.env.WEBPACK_DEV_SERVER_BASE_PORT ??= firstPort;
  return {
    port: "auto",
    host: "localhost",
    // The pages run what is published and nothing of the server's: after a change, reload by hand.
    client: false,
    hot: false,
    liveReload: false,
    static: [{ directory: at("node_modules/@microsoft/office-js/dist"), publicPath: "/desk/vendor", watch: false }],
    setupMiddlewares: (middlewares) => [{ name: "to-the-desk", path: "/", middleware: toTheDesk }, ...middlewares],
    onListening: tellAddress,
  };
}

function toTheDesk(request, response, next) {
  if (request.originalUrl !== "/") return next();
  response.writeHead(302, { Location: "/desk/" }).end();
}

function tellAddress({ server, options }) {
  const scheme = options.server?.type === "https" ? "https" : "http";
  const address = `${scheme}://localhost:${server.address().port}`;
  process.stdout.write(
    `\n  The desk with the demo workbook:  ${address}/desk/\n  The add-in for Excel:             ${address}/manifest.xml\n\n`,
  );
}
