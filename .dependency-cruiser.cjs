// Imports only point down this list; the reason for each layer stands in DEVELOPERS.md.
const layers = [
  "hosts",
  "revision",
  "files",
  "sheet",
  "plan",
  "table",
  "catalog",
  "call",
  "functions",
  "units",
  "kernel",
];

const upward = layers.slice(1).map((layer, index) => ({
  name: `${layer}-imports-only-downwards`,
  severity: "error",
  from: { path: `^src/${layer}/` },
  to: { path: `^src/(${layers.slice(0, index + 1).join("|")})/` },
}));

module.exports = {
  forbidden: [
    ...upward,
    {
      name: "kernel-imports-nothing",
      severity: "error",
      from: { path: "^src/kernel/" },
      to: { pathNot: "^src/kernel/" },
    },
    {
      name: "hosts-stay-apart",
      severity: "error",
      from: { path: "^src/hosts/([^/]+)/" },
      to: { path: "^src/hosts/([^/]+)/", pathNot: "^src/hosts/$1/" },
    },
    {
      name: "only-hosts-know-the-machine",
      comment: "Below the hosts nothing may need Node or a browser: the same code runs in all three hosts.",
      severity: "error",
      from: { path: "^src/", pathNot: "^src/hosts/" },
      to: { dependencyTypes: ["core"] },
    },
    { name: "no-circles", severity: "error", from: {}, to: { circular: true } },
    { name: "nothing-unresolved", severity: "error", from: {}, to: { couldNotResolve: true } },
  ],
  options: {
    doNotFollow: { path: "node_modules" },
    tsConfig: { fileName: "tsconfig.json" },
    tsPreCompilationDeps: true,
    enhancedResolveOptions: {
      exportsFields: ["exports"],
      extensions: [".ts", ".js"],
      conditionNames: ["import", "default", "types"],
    },
  },
};
