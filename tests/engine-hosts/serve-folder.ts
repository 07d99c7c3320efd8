import { readFile } from "node:fs/promises";
import { createServer } from "node:http";
import path from "node:path";

const TYPES: { readonly [extension: string]: string } = {
  ".html": "text/html",
  ".js": "text/javascript",
  ".wasm": "application/wasm",
};

/** Serves the files of a folder on a free port of this machine. */
export async function serveFolder(folder: string): Promise<{ readonly address: string; close(): void }> {
  const server = createServer((request, response) => {
    const { pathname } = new URL(request.url ?? "/", "http://127.0.0.1");
    const file = path.join(folder, path.normalize(pathname === "/" ? "/index.html" : pathname));
    readFile(file).then(
      (bytes) => {
        response.setHeader("Content-Type", TYPES[path.extname(file)] ?? "application/octet-stream");
        response.end(bytes);
      },
      () => response.writeHead(404).end(),
    );
  });
  await new Promise<void>((resolve) => server.listen(0, "127.0.0.1", resolve));
  const at = server.address();
  if (at === null || typeof at === "string") throw new Error("The page's server has no port.");
  return { address: `http://127.0.0.1:${at.port}/`, close: () => void server.close() };
}
