/** The arrows of the project. Each rule says why; DEVELOPERS.md draws them. */
const features = "auth|classes|course|assignments|shows|marking|songs|square|lineup|handover|admin";
const testFiles = "\\.(test|spec)\\.tsx?$";

export default {
  forbidden: [
    {
      name: "no-cycles",
      comment: "Two modules that need each other are one module, or miss a third.",
      severity: "error",
      from: {},
      to: { circular: true, viaOnly: { dependencyTypesNot: ["type-only"] } },
    },
    {
      name: "shared-needs-only-zod",
      comment: "Contracts run on both sides; whatever they import, both sides carry.",
      severity: "error",
      from: { path: "^shared/", pathNot: testFiles },
      to: { pathNot: "^shared/|^node_modules/zod/" },
    },
    {
      name: "sandbox-is-pure",
      comment: "The show must come out the same in a browser and on a server: no host, no side.",
      severity: "error",
      from: { path: "^sandbox/", pathNot: `${testFiles}|^sandbox/engine/library/build` },
      to: {
        pathNot:
          "^sandbox/|^shared/|^node_modules/(typescript|ts-blank-space|quickjs-emscripten-core|@jitl|zod|@tonejs/midi|midi-file)/",
      },
    },
    {
      name: "client-keeps-off-the-server",
      comment: "What reaches the browser is public: no server code, no database.",
      severity: "error",
      from: { path: "^src/" },
      to: { path: "^(server|tests|drizzle)/", pathNot: "^tests/support/dom" },
    },
    {
      name: "server-keeps-off-the-client",
      comment: "The server draws no page; what both need lives in shared or sandbox.",
      severity: "error",
      from: { path: "^server/" },
      to: { path: "^src/" },
    },
    {
      name: "nobody-needs-tests",
      comment: "The product must run without its tests.",
      severity: "error",
      from: { path: "^(src|server|sandbox|shared|lessons)/", pathNot: testFiles },
      to: { path: "^tests/" },
    },
    {
      name: "features-stand-apart-on-the-client",
      comment: "Routes join features; a feature that imports another can not be read or moved alone.",
      severity: "error",
      from: { path: `^src/features/(${features})/` },
      to: { path: "^src/features/", pathNot: "^src/features/$1/" },
    },
    {
      name: "features-stand-apart-on-the-server",
      comment: "server/app.ts joins features; what several need lives beside them.",
      severity: "error",
      from: { path: `^server/features/(${features})/`, pathNot: testFiles },
      to: { path: "^server/features/", pathNot: "^server/features/$1/" },
    },
    {
      name: "services-know-no-http",
      comment: "A service is a function of database, actor and input, so that jobs and the command line can call it.",
      severity: "error",
      from: { path: "\\.service\\.ts$" },
      to: { path: "^node_modules/(express|helmet)/" },
    },
    {
      name: "components-know-no-features",
      comment: "src/components is the design system: it gets words and callbacks.",
      severity: "error",
      from: { path: "^src/components/" },
      to: { path: "^src/(features|routes)/" },
    },
    {
      name: "virtual-machine-only-in-workers",
      comment:
        "An endless loop must never freeze a tab or the server: the engine runs behind a thread that can be ended.",
      severity: "error",
      from: { path: "^(src|server)/", pathNot: `\\.worker\\.ts$|^server/runs/node-host\\.ts$|${testFiles}` },
      to: { path: "^node_modules/(quickjs-emscripten-core|@jitl)/" },
    },
    {
      name: "node-host-only-in-workers",
      comment: "It holds the virtual machine: as above.",
      severity: "error",
      from: { path: "^server/", pathNot: `\\.worker\\.ts$|${testFiles}` },
      to: { path: "^server/runs/node-host\\.ts$" },
    },
  ],
  options: {
    tsPreCompilationDeps: true,
    tsConfig: { fileName: "tsconfig.base.json" },
    doNotFollow: { path: "node_modules" },
    exclude: { path: "^(dist|var|coverage)/" },
    enhancedResolveOptions: { extensions: [".ts", ".tsx", ".js", ".mjs", ".json"] },
  },
};
