import * as Comlink from "comlink";
import type { CheckInput } from "../../sandbox/checks/context.ts";
import { checkShow } from "../../sandbox/checks/index.ts";
import type { Finding } from "../../sandbox/engine/model.ts";

/** The show check, away from the page's own thread. Rejects with `RangeError` for a timeline of another square. */
const checkWorker = {
  check: (input: CheckInput): Finding[] => checkShow(input),
};

export type CheckWorker = typeof checkWorker;

Comlink.expose(checkWorker);
