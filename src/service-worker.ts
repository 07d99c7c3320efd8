/* eslint-disable no-restricted-globals -- this is where requests of the whole page pass through */
/**
 * Keeps the built files of the application on this computer, so that it opens without a network.
 * What belongs to a person (answers of the API) never comes here: pages keep that by user, see
 * `lib/offline-shelf.ts`. One cache holds the files; their names carry their hash, so that a new
 * version only fetches what changed.
 */

/** The parts of a service worker's world that are used here; TypeScript's own list of it does not go with the page's. */
interface WorkerEvent extends Event {
  waitUntil(work: Promise<unknown>): void;
}
interface RequestEvent extends WorkerEvent {
  readonly request: Request;
  respondWith(answer: Promise<Response>): void;
}
interface WorkerScope {
  addEventListener(type: "install" | "activate", listener: (event: WorkerEvent) => void): void;
  addEventListener(type: "fetch", listener: (event: RequestEvent) => void): void;
}

/** Every file of the build; the build puts the list in place of this word. */
declare const BUILT_FILES: readonly string[];

/** Taken over once, so that the list stands in the file once. */
const FILES: ReadonlySet<string> = new Set(BUILT_FILES);

const CACHE = "duskbell-files";
const SHELL = "/index.html";
/** A page that has not come by then is taken from here: better than a white window on a poor line. */
const PATIENCE_MS = 5000;

const scope = self as unknown as WorkerScope;

/** One after another: the page that is being looked at comes first. */
async function keepFiles(): Promise<void> {
  const cache = await caches.open(CACHE);
  for (const file of FILES) {
    const isHashed = file.startsWith("/assets/");
    if (isHashed && (await cache.match(file))) continue;
    const answer = await fetch(file, isHashed ? {} : { cache: "no-cache" });
    if (!answer.ok) throw new Error(`${file} came with the status ${answer.status}.`);
    await cache.put(file, answer);
  }
}

/** Files of versions before. */
async function dropOldFiles(): Promise<void> {
  const cache = await caches.open(CACHE);
  for (const request of await cache.keys()) if (!FILES.has(new URL(request.url).pathname)) await cache.delete(request);
}

async function findKept(path: string): Promise<Response | undefined> {
  return (await caches.open(CACHE)).match(path);
}

/** The server's answer; what is kept when there is none, or none in time. */
async function askFirst(request: Request, keptPath: string): Promise<Response> {
  const kept = await findKept(keptPath);
  if (!kept) return fetch(request);
  const late = new Promise<Response>((resolve) => setTimeout(() => resolve(kept), PATIENCE_MS));
  return Promise.race([fetch(request).catch(() => kept), late]);
}

async function keptFirst(request: Request, path: string): Promise<Response> {
  return (await findKept(path)) ?? fetch(request);
}

scope.addEventListener("install", (event) => event.waitUntil(keepFiles()));
scope.addEventListener("activate", (event) => event.waitUntil(dropOldFiles()));
scope.addEventListener("fetch", (event) => {
  const { request } = event;
  const url = new URL(request.url);
  if (request.method !== "GET" || url.origin !== location.origin || url.pathname.startsWith("/api/")) return;
  if (request.mode === "navigate") event.respondWith(askFirst(request, SHELL));
  else if (url.pathname.startsWith("/assets/")) event.respondWith(keptFirst(request, url.pathname));
  else if (FILES.has(url.pathname)) event.respondWith(askFirst(request, url.pathname));
});
