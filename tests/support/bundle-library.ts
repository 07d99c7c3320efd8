import { writeFile } from "node:fs/promises";
import { fileURLToPath } from "node:url";
import { rolldown } from "rolldown";

const ENTRANCE = fileURLToPath(new URL("../../sandbox/engine/library/main.ts", import.meta.url));

/** What the library keeps for itself before it takes it from the scripts' realm (see `library/harden.ts`). */
const OWN_GLOBALS = ["Reflect", "Symbol", "Uint8Array", "Uint16Array", "Uint32Array"];

/** Where the bundled library is kept. */
export const GENERATED_LIBRARY = fileURLToPath(new URL("../../sandbox/engine/library.generated.ts", import.meta.url));

/**
 * The text of `sandbox/engine/library.generated.ts`: the library that scripts see as one expression
 * for QuickJS. The file is committed, so that a fresh clone runs without a build; a test compares.
 */
export async function bundleLibrary(): Promise<string> {
  const build = await rolldown({ input: ENTRANCE, logLevel: "silent" });
  const { output } = await build.generate({
    format: "iife",
    name: "library",
    banner: `(() => { const { ${OWN_GLOBALS.join(", ")} } = globalThis;`,
    footer: "return library.library; })()",
    comments: false,
    minify: { compress: false, mangle: false, codegen: { removeWhitespace: true } },
  });
  await build.close();
  return [
    "/** The library that scripts see, bundled from `library/main.ts` by `tests/support/bundle-library.ts`. Do not edit. */",
    `export const LIBRARY = ${JSON.stringify(output[0].code)};`,
    "",
  ].join("\n");
}

if (process.argv[1] === fileURLToPath(import.meta.url)) await writeFile(GENERATED_LIBRARY, await bundleLibrary());
