import { darkTheme, installLoader, lightTheme } from "../desk/client/loader.ts";
import { lineToPage } from "../desk/page/line.ts";
import { passPartKey } from "../desk/page/passKey.ts";

/** Excel's own client library, served from its package. */
const library = "desk/vendor/excel-win32-16.01.debug.js";

const theme = matchMedia("(prefers-color-scheme: dark)").matches ? darkTheme : lightTheme;

installLoader(globalThis, lineToPage(window.parent, location.origin), { theme, platform: "PC" });
keepOffice();
passPartKey(window.parent, location.origin);

// As the real loader does it: nothing else makes the library run before the page's own scripts begin.
// eslint-disable-next-line @typescript-eslint/no-deprecated -- a script put in any other way may run after them
document.write(`<script src="${library}"></script>`);

/** The library holds an older object of the same name and would put it in the place of the loader's. */
function keepOffice(): void {
  const office = globalThis.Office;
  Object.defineProperty(globalThis, "Office", { get: () => office, set: () => undefined });
}
