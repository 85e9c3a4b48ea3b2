import { build } from "esbuild";
import webpack from "webpack";
import { helpPage } from "./helpPage.js";

const plugin = "FunctionsFiles";

/** Emits functions.json, which Excel reads, and help.html, which each function's help link opens, from the function table. */
export class FunctionsFiles {
  constructor({ help, footingUrl }) {
    this.help = help;
    this.footingUrl = footingUrl;
  }

  apply(compiler) {
    compiler.hooks.thisCompilation.tap(plugin, (compilation) => {
      const stage = webpack.Compilation.PROCESS_ASSETS_STAGE_ADDITIONAL;
      compilation.hooks.processAssets.tapPromise({ name: plugin, stage }, () => this.emit(compilation));
    });
  }

  async emit(compilation) {
    const { module, files } = await load(this.help);
    files.forEach((file) => compilation.fileDependencies.add(file));
    const help = module.functionsHelp();
    const json = JSON.stringify(help.metadata, null, 2).replaceAll("FOOTING_URL", this.footingUrl);
    compilation.emitAsset("functions.json", new webpack.sources.RawSource(json));
    compilation.emitAsset("help.html", new webpack.sources.RawSource(helpPage(help)));
  }
}

/** Runs a TypeScript module of the sources during the build. */
async function load(entry) {
  const { outputFiles, metafile } = await build({
    entryPoints: [entry],
    bundle: true,
    write: false,
    metafile: true,
    format: "esm",
    platform: "node",
  });
  const code = Buffer.from(outputFiles[0].contents).toString("base64");
  const module = await import(`data:text/javascript;base64,${code}`);
  return { module, files: Object.keys(metafile.inputs).map((file) => compilerPath(file)) };
}

const compilerPath = (file) => new URL(file, `file://${process.cwd()}/`).pathname;
