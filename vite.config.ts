import react from "@vitejs/plugin-react";
import tailwindcss from "@tailwindcss/vite";
import { defineConfig, type Plugin } from "vite";

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
        const files = Object.keys(bundle).filter((name) => name.startsWith("assets/") && !name.endsWith(".map"));
        const list = JSON.stringify([...OTHER_FILES, ...files.map((name) => `/${name}`).sort()]);
        worker.code = worker.code.replaceAll("BUILT_FILES", list);
      },
    },
  };
}

export default defineConfig({
  plugins: [react({ compiler: true }), tailwindcss(), listBuiltFiles()],
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
