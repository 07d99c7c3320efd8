import vm from "node:vm";
import { readFileSync } from "node:fs";
import path from "node:path";
import { LIBRARY } from "../../sandbox/engine/library.generated.ts";
import { createEngine } from "../../sandbox/engine/engine.ts";
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

/** A whole three-minute show for the demo square: verse, chorus and drums, as a good pupil writes it. */
const SHOWPIECE = path.resolve(import.meta.dirname, "../samples/showpiece.ts");

/**
 * A typical show through the whole engine (compile, fresh module, marks, limits, decoding, hash)
 * against the same marked code and library in a bare QuickJS, and in node:vm.
 */
export async function benchRuns(): Promise<Figure[]> {
  const host = await createNodeHost();
  const engine = createEngine(host);
  const input: RunInput = {
    source: readFileSync(SHOWPIECE, "utf8"),
    songId: "bench",
    song: demoSong("quillhaven-bells").beatMap,
    layout: DEMO_SQUARE,
    seed: SEED,
  };
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
  return [
    {
      name: "run of a three-minute show",
      value: times.engine,
      unit: "ms",
      against: "bare QuickJS on the same code",
      ratio: times.engine / times.bare,
    },
    {
      name: "run of a three-minute show",
      value: times.engine,
      unit: "ms",
      against: "node:vm on the same code",
      ratio: times.engine / times.vm,
    },
    { name: "fuel of a three-minute show", value: outcome.fuel, unit: "polls", against: null, ratio: null },
    { name: "cues of a three-minute show", value: outcome.cueCount, unit: "cues", against: null, ratio: null },
  ];
}
