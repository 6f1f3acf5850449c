import { chmod } from "node:fs/promises";
import { fileURLToPath } from "node:url";
import { gzipSync } from "node:zlib";
import { tsImport } from "tsx/esm/api";
import webpack from "webpack";

const at = (path) => fileURLToPath(new URL(path, import.meta.url));
const building = (name, host = "office") => tsImport(`./src/hosts/${host}/build/${name}.ts`, import.meta.url);

const common = {
  devtool: "source-map",
  experiments: { outputModule: true },
  module: {
    rules: [
      { test: /\.ts$/, loader: "ts-loader", options: { transpileOnly: true } },
      // The package does not say so itself: what is not named of it is left out.
      { test: /node_modules\/@formulajs\/formulajs\//, sideEffects: false },
    ],
  },
  resolve: {
    extensions: [".ts", ".js"],
    extensionAlias: { ".js": [".ts", ".js"] },
    // The worksheet functions that are taken from formulajs need neither statistics nor Bessel functions of others.
    alias: { jstat: false, bessel: false },
  },
  performance: { hints: false },
  stats: "errors-warnings",
};

/** The command can be run as it is. */
const runnable = {
  apply(compiler) {
    compiler.hooks.afterEmit.tapPromise("runnable", async () => {
      await chmod(at("dist/cli.js"), 0o755);
    });
  },
};

/** The files beside the scripts that make the add-in's folder whole: what the host reads of it, its pages and icons. */
const addinFiles = (base) => ({
  apply(compiler) {
    const { RawSource } = compiler.webpack.sources;
    compiler.hooks.thisCompilation.tap("addinFiles", (compilation) => {
      const stage = webpack.Compilation.PROCESS_ASSETS_STAGE_REPORT;
      compilation.hooks.processAssets.tapPromise({ name: "addinFiles", stage }, async () => {
        const { addinFiles } = await building("addinFiles");
        for (const [name, content] of await addinFiles(base)) {
          compilation.emitAsset(name, new RawSource(content), { minimized: true });
        }
      });
    });
  },
});

/** What has to be loaded before anything can be calculated is told with every build. */
const toldSize = (name, scripts) => ({
  apply(compiler) {
    compiler.hooks.emit.tap("toldSize", (compilation) => {
      for (const script of scripts) {
        const size = gzipSync(compilation.getAsset(script).source.buffer()).length / 1000;
        compiler.getInfrastructureLogger(name).info(`${script} is ${size.toFixed(1)} kB gzipped`);
      }
    });
  },
});

/** The files beside the scripts of the page, and the list of all of them that the service worker keeps. */
const benchFiles = {
  apply(compiler) {
    const { ConcatSource, RawSource } = compiler.webpack.sources;
    compiler.hooks.thisCompilation.tap("benchFiles", (compilation) => {
      const stage = webpack.Compilation.PROCESS_ASSETS_STAGE_REPORT;
      compilation.hooks.processAssets.tapPromise({ name: "benchFiles", stage }, async (assets) => {
        const [{ benchFiles }, { keptFilesLine }] = await Promise.all(
          ["benchFiles", "keptFiles"].map((name) => building(name, "bench")),
        );
        for (const [name, content] of await benchFiles()) {
          compilation.emitAsset(name, new RawSource(content), { minimized: true });
        }
        const contents = Object.entries(assets).map(([name, source]) => [name, source.buffer()]);
        const line = keptFilesLine(new Map(contents));
        compilation.updateAsset("service-worker.js", (script) => new ConcatSource(line, script));
      });
    });
  },
};

const cli = {
  ...common,
  name: "cli",
  target: "node20",
  entry: { cli: at("src/hosts/cli/main.ts") },
  output: {
    path: at("dist"),
    filename: "[name].js",
    module: true,
    chunkFormat: "module",
    assetModuleFilename: "[name][ext]",
  },
  optimization: { minimize: false },
  plugins: [new webpack.BannerPlugin({ banner: "#!/usr/bin/env node", raw: true }), runnable],
};

const library = {
  ...common,
  name: "library",
  target: ["web", "es2022"],
  entry: { index: at("src/index.ts") },
  output: { path: at("dist"), filename: "[name].js", library: { type: "module" }, chunkFormat: "module" },
  optimization: { minimize: false },
};

const addin = (base) => ({
  ...common,
  name: "addin",
  target: ["web", "es2022"],
  devtool: false,
  experiments: {},
  entry: {
    functions: at("src/hosts/office/functions.ts"),
    pane: { import: at("src/hosts/office/pane/main.ts"), dependOn: "functions" },
  },
  output: { path: at("dist/addin"), filename: "[name].js", clean: true },
  infrastructureLogging: { level: "info" },
  plugins: [addinFiles(base), toldSize("addin", ["functions.js"])],
});

/** Minimising takes most of a build and spares a page from this machine nothing; `quick` leaves it out. */
const bench = (quick) => ({
  ...common,
  name: "bench",
  target: ["web", "es2022"],
  devtool: false,
  experiments: {},
  entry: {
    main: at("src/hosts/bench/page/main.ts"),
    worker: { import: at("src/hosts/bench/worker/main.ts"), chunkLoading: "import-scripts" },
    "service-worker": at("src/hosts/bench/offline/serviceWorker.ts"),
  },
  output: { path: at("dist/bench"), filename: "[name].js", clean: true },
  infrastructureLogging: { level: "info" },
  optimization: { minimize: !quick },
  plugins: quick ? [benchFiles] : [benchFiles, toldSize("bench", ["main.js", "worker.js"])],
});

/** The add-in served by this machine, at the first free port; what to do with it is printed. */
async function served(env) {
  const [{ baseAddress }, { freePort }, { localhostCertificate }, { sideloadText }] = await Promise.all(
    ["baseAddress", "freePort", "localhostCertificate", "sideloadText"].map(building),
  );
  const port = await freePort(3443);
  const base = baseAddress(env.base ?? `https://localhost:${port}`);
  const { key, cert, path } = await localhostCertificate();
  return {
    ...addin(base),
    devServer: {
      host: "localhost",
      port,
      server: { type: "https", options: { key, cert } },
      headers: { "Access-Control-Allow-Origin": "*", "Cache-Control": "no-cache" },
      static: false,
      client: false,
      hot: false,
      liveReload: false,
      devMiddleware: { writeToDisk: true, stats: "errors-warnings" },
      onListening: () => process.stdout.write(sideloadText(base, at("dist/addin/manifest.xml"), path)),
    },
  };
}

/** `--env base=https://...` says where the add-in's folder is hosted. */
export default async function configurations(env) {
  if (env.WEBPACK_SERVE) return served(env);
  const { baseAddress } = await building("baseAddress");
  return [cli, library, addin(baseAddress(env.base)), bench(env.quick)];
}
