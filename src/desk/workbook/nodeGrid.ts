import { register } from "node:module";
import type { Grid } from "./grid.ts";

// Node reads opentype.js as CommonJS, where the grid's named import of it does not exist; the same package carries
// the module that bundlers take.
const takeTheModule = `export const resolve = (specifier, context, next) =>
  next(specifier === "opentype.js" ? "opentype.js/dist/opentype.mjs" : specifier, context);`;
register(`data:text/javascript,${encodeURIComponent(takeTheModule)}`);

/** Starts Univer without a screen. Loaded late, because the packages must not be read before the line above. */
export async function startNodeGrid(): Promise<Grid> {
  const [core, facade, preset, { default: enUS }] = await Promise.all([
    import("@univerjs/core"),
    import("@univerjs/core/facade"),
    import("@univerjs/preset-sheets-node-core"),
    import("@univerjs/preset-sheets-node-core/locales/en-US"),
  ]);
  const locale = core.LocaleType.EN_US;
  const univer = new core.Univer({ logLevel: core.LogLevel.ERROR, locale, locales: { [locale]: enUS } });
  // Saved values stand until a cell changes: Excel does not recalculate add-in functions on opening either.
  const formula = { initialFormulaComputing: preset.CalculationMode.NO_CALCULATION };
  for (const plugin of preset.UniverSheetsNodeCorePreset({ formula }).plugins) {
    if (Array.isArray(plugin)) univer.registerPlugin(plugin[0], plugin[1]);
    else univer.registerPlugin(plugin);
  }
  return {
    api: facade.FUniver.newAPI(univer),
    injector: univer.__getInjector(),
    // Without a page it listens from the start.
    awaken: () => undefined,
    dispose: () => {
      const words = univer.__getInjector().get(core.LocaleService);
      univer.dispose();
      // A calculation that was under way says a second later how far it has come, in words that are gone by then.
      words.t = (key) => key;
    },
  };
}
