import { hashHost } from "../../../src/workers/browser-hash.ts";
import { newBrowserModule } from "../../../src/workers/browser-host.worker.ts";
import type { StraightInput } from "../straight-client.ts";
import { runStraight } from "../straight-run.ts";

/** A worker of the page that runs scripts straight in the engine, on the host of the product's own. */
const host = { ...hashHost, newModule: newBrowserModule };

self.addEventListener("message", ({ data }: MessageEvent<StraightInput>) => {
  void runStraight(host, data).then((end) => self.postMessage(end));
});
self.postMessage("ready");
