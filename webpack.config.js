import CopyPlugin from "copy-webpack-plugin";
import { EsbuildPlugin } from "esbuild-loader";
import { fileURLToPath } from "node:url";
import webpack from "webpack";
import { FunctionsFiles } from "./.config/webpack/functionsFiles.js";
import { deskServer } from "./.config/webpack/deskServer.js";

const at = (path) => fileURLToPath(new URL(path, import.meta.url));

/** Where the built add-in will be served; manifest.xml and the functions' help links carry it. */
const footingUrl = (process.env.FOOTING_URL ?? "https://localhost:3000").replace(/\/+$/, "");
/** Every browser that Excel's SharedRuntime runs in knows this. */
const target = "es2022";

const excelsLibrary = "https://appsforoffice.microsoft.com/lib/1/hosted/office.js";

const shared = {
  context: at("."),
  resolve: { extensions: [".tsx", ".ts", ".mjs", ".js"] },
  module: {
    rules: [
      { test: /\.tsx?$/, loader: "esbuild-loader", options: { target } },
      { test: /\.css$/, use: ["style-loader", "css-loader"] },
    ],
  },
  // Sizes are held by a test, gzipped as they travel.
  performance: false,
  stats: "errors-warnings",
};

const cache = { type: "filesystem", buildDependencies: { config: [at("webpack.config.js")] } };

const common = (name, mode) => ({
  ...shared,
  name,
  mode,
  cache: { ...cache, name: `${name}-${mode}` },
  // No eval: the pages forbid it.
  devtool: mode === "production" ? false : "cheap-module-source-map",
  optimization: {
    // One file a bundle: the manifest and the pages name them.
    splitChunks: false,
    ...(mode === "production" && { minimizer: [new EsbuildPlugin({ target, css: true })] }),
  },
});

/** What Excel loads: nothing of the desk's is in it. One page holds functions and pane, so they share one runtime. */
const addIn = (mode, serving) => ({
  ...common("add-in", mode),
  entry: {
    functions: "./src/entries/functions.ts",
    pane: { import: "./src/entries/taskpane.tsx", dependOn: "functions" },
  },
  output: {
    path: at("dist"),
    publicPath: serving ? "/" : "auto",
    filename: "[name].js",
    chunkFilename: "[name].js",
    clean: { keep: /^(desk\/|terminal)/ },
  },
  plugins: [
    new FunctionsFiles({ help: at("src/functions/help.ts"), footingUrl }),
    new CopyPlugin({
      patterns: [
        { from: at("src/entries/taskpane.html") },
        { from: at("assets/icons/*.png"), to: "icons/[name][ext]" },
        { from: at("manifest.xml"), transform: (text) => text.toString().replaceAll("FOOTING_URL", footingUrl) },
      ],
    }),
  ],
});

/** The stand-in spreadsheet. Its pane is the add-in's own page; only the address of Excel's library differs. */
const desk = (mode, serving) => ({
  ...common("desk", mode),
  entry: { desk: "./src/entries/desk.tsx", office: "./src/entries/deskOffice.ts" },
  output: {
    path: at("dist/desk"),
    publicPath: serving ? "/desk/" : "auto",
    filename: "[name].js",
    chunkFilename: "[name].js",
    clean: true,
  },
  plugins: [
    new CopyPlugin({
      patterns: [
        { from: at("src/entries/desk.html"), to: "index.html" },
        { from: at("src/entries/taskpane.html"), transform: (text) => deskPane(text.toString()) },
      ],
    }),
  ],
  devServer: deskServer(at),
});

const deskPane = (page) =>
  page.replace("<head>", '<head>\n    <base href="../" />').replace(excelsLibrary, "desk/office.js");

/** The command line. Packages that read files of their own, and the desk's, stay in node_modules. */
const terminal = (mode) => ({
  ...common("terminal", mode),
  // The program looks for its packages from where it lies when it runs, not from where it was built.
  module: { ...shared.module, parser: { javascript: { importMeta: false, createRequire: false } } },
  target: "node20",
  entry: { terminal: "./src/entries/terminal.ts" },
  experiments: { outputModule: true },
  output: {
    path: at("dist"),
    filename: "[name].mjs",
    chunkFilename: "terminal-[id].mjs",
    module: true,
    chunkFormat: "module",
    library: { type: "module" },
  },
  externalsType: "module",
  externals: [/^@univerjs\//, /^@microsoft\/office-js/, /^hucre/, /^rxjs/],
  plugins: [new webpack.BannerPlugin({ banner: "#!/usr/bin/env node", raw: true })],
});

export default (env = {}, { mode = "production" } = {}) => {
  const serving = env.WEBPACK_SERVE === true;
  return serving ? [addIn(mode, serving), desk(mode, serving)] : [addIn(mode), desk(mode), terminal(mode)];
};
