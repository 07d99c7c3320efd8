import * as Comlink from "comlink";
import type { CheckInput } from "../../sandbox/checks/context.ts";
import { createShowCheck } from "../../sandbox/checks/index.ts";
import type { Finding } from "../../sandbox/engine/model.ts";

/** The check of the square and song at hand: a script that is edited is checked on the same ones again. */
let open: { readonly key: string; readonly check: ReturnType<typeof createShowCheck> } | null = null;

/** The show check, away from the page's own thread. Rejects with `RangeError` for a timeline of another square. */
const checkWorker = {
  check: ({ timeline, ...setting }: CheckInput): Finding[] => {
    // Every message brings a copy of the setting, so what is in it is compared.
    const key = JSON.stringify(setting);
    if (open?.key !== key) open = { key, check: createShowCheck(setting) };
    return open.check(timeline);
  },
};

export type CheckWorker = typeof checkWorker;

Comlink.expose(checkWorker);
