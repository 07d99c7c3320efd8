import react from "@vitejs/plugin-react";
import tailwindcss from "@tailwindcss/vite";
import { defineConfig } from "vite";

const apiOrigin = process.env.DUSKBELL_API_ORIGIN ?? "http://127.0.0.1:8120";

/** What nearly every page needs and what changes only with an upgrade: one chunk, so that a release leaves it in the browser's cache. */
const FRAMEWORK =
  /node_modules\/(react|react-dom|scheduler|react-router|@tanstack\/react-query|@tanstack\/query-core|zod)\//;

export default defineConfig({
  plugins: [react(), tailwindcss()],
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
      output: {
        codeSplitting: { groups: [{ name: "framework", test: FRAMEWORK }] },
      },
    },
  },
});
