import vm from "node:vm";
import { readdirSync, readFileSync } from "node:fs";
import path from "node:path";
import { LIBRARY } from "../../sandbox/engine/library.generated.ts";
import { createEngine, type EngineHost } from "../../sandbox/engine/engine.ts";
import { FUEL_LIMIT } from "../../sandbox/engine/limits.ts";
import type { RunInput } from "../../sandbox/engine/model.ts";
import { prepareRun } from "../../sandbox/engine/prepare.ts";
import { buildTables } from "../../sandbox/engine/tables.ts";
import { createNodeHost } from "../../server/runs/node-host.worker.ts";
import { demoSong } from "../../server/db/seed/world/songs/demo-songs.ts";
import { DEMO_SQUARE } from "../../server/db/seed/world/square.ts";
import { type Figure, timeInTurns } from "./measure.ts";

const ROUNDS = 9;
const SEED = 20_261_201;
const KEEP_GLOBAL_OPEN =
  "{ const { freeze } = Object; Object.freeze = (value) => (value === globalThis ? value : freeze(value)); }";

const SAMPLES = path.resolve(import.meta.dirname, "../samples");

/** A whole three-minute show for the demo square: verse, chorus and drums, as a good pupil writes it. */
const TYPICAL = readFileSync(path.join(SAMPLES, "showpiece.ts"), "utf8");
/** Some ten thousand cues, each through two functions: the most that the marks of a script have to do. */
export const HEAVY = `function glow(light: Lights, level: number) {
  light.fadeTo(level, 1);
}
function turn(lights: Lights, level: number) {
  for (const light of lights) glow(light, level);
}
for (let beat = 0; beat < 100; beat++) {
  turn(square.all.first(100), beat % 2 === 0 ? 80 : 20);
  wait(1);
}
`;

/**
 * Shows through the whole engine (compile, fresh module, marks, limits, decoding, hash) against the same
 * marked code and library in a bare QuickJS, and in node:vm; and the fuel of every sample.
 */
export async function benchRuns(): Promise<Figure[]> {
  const host = await createNodeHost();
  return [
    ...(await measureRun(host, "a three-minute show", TYPICAL)),
    ...(await measureRun(host, "a heavy show", HEAVY)),
    ...listFuel(),
  ];
}

async function measureRun(host: EngineHost, name: string, source: string): Promise<Figure[]> {
  const engine = createEngine(host);
  const song = demoSong("quillhaven-bells").beatMap;
  const input: RunInput = { source, songId: "bench", song, layout: DEMO_SQUARE, seed: SEED };
  const prepared = prepareRun(input);
  if (!prepared.ok) throw new Error(`The bench script does not compile: ${prepared.problem.sentence}`);
  const { code } = prepared.work;
  const tables = JSON.stringify(buildTables(input.layout, input.song));
  const luck = JSON.stringify(prepared.work.luck);

  const outcome = await engine.run(input);
  if (!outcome.ok) throw new Error(`The bench script does not run: ${outcome.problem.sentence}`);
  const times = await timeInTurns(ROUNDS, {
    engine: () => engine.run(input),
    bare: async () => {
      const context = (await host.newModule()).newContext();
      const library = context.unwrapResult(context.evalCode(LIBRARY, "library.js"));
      const call = (name: string, argument: Parameters<typeof context.callFunction>[2]) =>
        context.unwrapResult(context.callFunction(context.getProp(library, name), context.undefined, argument));
      call("open", context.newString(tables));
      call("deal", context.newString(luck));
      call("run", context.unwrapResult(context.evalCode(code, "script.js")));
    },
    vm: () => {
      const realm = vm.createContext({});
      // The global object of a node:vm realm can not be frozen; all else of the closing stays.
      vm.runInContext(KEEP_GLOBAL_OPEN, realm);
      const library = vm.runInContext(LIBRARY, realm) as {
        open(tables: string): void;
        deal(luck: string): void;
        run(script: unknown): void;
      };
      library.open(tables);
      library.deal(luck);
      library.run(vm.runInContext(code, realm));
    },
  });
  const figure = (against: string, ratio: number): Figure => ({
    name: `run of ${name}`,
    value: times.engine,
    unit: "ms",
    against,
    ratio,
  });
  return [
    figure("bare QuickJS on the same code", times.engine / times.bare),
    figure("node:vm on the same code", times.engine / times.vm),
    { name: `cues of ${name}`, value: outcome.cueCount, unit: "cues", against: null, ratio: null },
  ];
}

/** Fuel of each sample, as its test holds it, against all that a run may use. */
function listFuel(): Figure[] {
  return readdirSync(SAMPLES)
    .filter((file) => file.endsWith(".json"))
    .map((file) => {
      const { fuel } = JSON.parse(readFileSync(path.join(SAMPLES, file), "utf8")) as { readonly fuel: number };
      const name = `fuel of the sample ${path.basename(file, ".json")}`;
      return { name, value: fuel, unit: "polls", against: "the limit", ratio: fuel / FUEL_LIMIT };
    });
}
