import react from "@vitejs/plugin-react";
import tailwindcss from "@tailwindcss/vite";
import { constants } from "node:zlib";
import { defineConfig, type Plugin } from "vite";
import { compression, defineAlgorithm } from "vite-plugin-compression2";

const apiOrigin = process.env.DUSKBELL_API_ORIGIN ?? "http://127.0.0.1:8120";

/** What nearly every page needs and what changes only with an upgrade: one chunk, so that a release leaves it in the browser's cache. */
const FRAMEWORK =
  /node_modules\/(react|react-dom|scheduler|react-router|@tanstack\/react-query|@tanstack\/query-core|zod)\//;

const SERVICE_WORKER = "service-worker.js";
/** Beside the built files: what `src/public` holds, and the page itself. */
const OTHER_FILES = ["/index.html", "/theme.js", "/mark.svg"];

/** Gives the service worker the list of the files it keeps, once they all have their names. */
function listBuiltFiles(): Plugin {
  return {
    name: "list-built-files",
    apply: "build",
    generateBundle: {
      order: "post",
      handler(_options, bundle) {
        const worker = bundle[SERVICE_WORKER];
        if (worker?.type !== "chunk") return;
        const files = Object.keys(bundle).filter((name) => name.startsWith("assets/") && !/\.(map|gz|br)$/.test(name));
        const list = JSON.stringify([...OTHER_FILES, ...files.map((name) => `/${name}`).sort()]);
        worker.code = worker.code.replaceAll("BUILT_FILES", list);
      },
    },
  };
}

/** Squeezed once, here, as small as it goes: a class that opens the studio at once would else keep the server busy with it. */
const compressFiles = compression({
  include: /\.(js|css|svg|wasm)$/,
  threshold: 1024,
  algorithms: [
    defineAlgorithm("gzip", { level: constants.Z_BEST_COMPRESSION }),
    defineAlgorithm("brotliCompress", {
      params: { [constants.BROTLI_PARAM_QUALITY]: constants.BROTLI_MAX_QUALITY },
    }),
  ],
});

export default defineConfig({
  plugins: [react({ compiler: true }), tailwindcss(), listBuiltFiles(), compressFiles],
  publicDir: "src/public",
  worker: { format: "es" },
  server: {
    host: "127.0.0.1",
    port: 5173,
    proxy: { "/api": { target: apiOrigin, changeOrigin: false } },
  },
  build: {
    outDir: "dist/client",
    // `light-dark()` must reach the browser as it is: a rewritten one cannot follow data-theme on a part of a page.
    target: ["chrome123", "edge123", "firefox121", "safari17.5"],
    sourcemap: false,
    // The content policy allows no data: addresses.
    assetsInlineLimit: 0,
    rolldownOptions: {
      input: { main: "index.html", "service-worker": "src/service-worker.ts" },
      output: {
        // Its address stays the same from version to version: that is how a browser finds the next one.
        entryFileNames: ({ name }) => (name === "service-worker" ? SERVICE_WORKER : "assets/[name]-[hash].js"),
        codeSplitting: { groups: [{ name: "framework", test: FRAMEWORK }] },
      },
    },
  },
});
