import { type Injector, LocaleType, LogLevel, mergeLocales, Univer, type PluginCtor } from "@univerjs/core";
import { FUniver } from "@univerjs/core/facade";
import { CalculationMode, UniverSheetsCorePreset } from "@univerjs/preset-sheets-core";
import coreWords from "@univerjs/preset-sheets-core/locales/en-US";
import { UniverSheetsDrawingPreset } from "@univerjs/preset-sheets-drawing";
import drawingWords from "@univerjs/preset-sheets-drawing/locales/en-US";
import { FormulaCalculationSessionController, TriggerCalculationController } from "@univerjs/sheets-formula";
import { defaultTheme } from "@univerjs/themes";
import "@univerjs/preset-sheets-core/lib/index.css";
import "@univerjs/preset-sheets-drawing/lib/index.css";
import type { Grid } from "../workbook/grid.ts";

/** Starts the grid on the page: cells, a line for the cell at hand, sheet tabs, and nothing else of an office suite. */
export function startBrowserGrid(container: HTMLElement, dark: boolean): Grid {
  const univer = new Univer({
    theme: defaultTheme,
    darkMode: dark,
    logLevel: LogLevel.ERROR,
    locale: LocaleType.EN_US,
    locales: { [LocaleType.EN_US]: mergeLocales(coreWords, drawingWords) },
  });
  for (const [plugin, options] of plugins(container)) univer.registerPlugin(plugin, options);
  const injector = univer.__getInjector();
  return { api: FUniver.newAPI(univer), injector, awaken: () => awaken(injector), dispose: () => univer.dispose() };
}

/** Each begins to listen when it is first asked for. */
function awaken(injector: Injector): void {
  injector.get(TriggerCalculationController);
  injector.get(FormulaCalculationSessionController);
}

type Chosen = readonly [PluginCtor, ConstructorParameters<PluginCtor>[0]?];

/** Both presets bring some plugins along; each is registered once, as the later preset has it. */
function plugins(container: HTMLElement): Iterable<Chosen> {
  const core = UniverSheetsCorePreset({
    container,
    // The header holds the line for the cell at hand; the toolbar, a part of it, would hold a whole office.
    header: true,
    toolbar: false,
    footer: { statisticBar: false, menus: false, zoomSlider: false },
    disableAutoFocus: true,
    // Saved values stand until a cell changes: Excel does not recalculate add-in functions on opening either.
    formula: { initialFormulaComputing: CalculationMode.NO_CALCULATION },
  });
  const chosen = new Map<string, Chosen>();
  for (const entry of [...core.plugins, ...UniverSheetsDrawingPreset().plugins]) {
    const [plugin, options] = Array.isArray(entry) ? entry : [entry];
    chosen.set(plugin.pluginName, [plugin, options]);
  }
  return chosen.values();
}
