import { chmod } from "node:fs/promises";
import { fileURLToPath } from "node:url";
import webpack from "webpack";

const at = (path) => fileURLToPath(new URL(path, import.meta.url));

const common = {
  devtool: "source-map",
  experiments: { outputModule: true },
  module: { rules: [{ test: /\.ts$/, loader: "ts-loader", options: { transpileOnly: true } }] },
  resolve: { extensions: [".ts", ".js"], extensionAlias: { ".js": [".ts", ".js"] } },
  performance: { hints: false },
};

/** The command can be run as it is. */
const runnable = {
  apply(compiler) {
    compiler.hooks.afterEmit.tapPromise("runnable", async () => {
      await chmod(at("dist/cli.js"), 0o755);
    });
  },
};

export default [
  {
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
  },
  {
    ...common,
    name: "library",
    target: ["web", "es2022"],
    entry: { index: at("src/index.ts") },
    output: { path: at("dist"), filename: "[name].js", library: { type: "module" }, chunkFormat: "module" },
    optimization: { minimize: false },
  },
];
