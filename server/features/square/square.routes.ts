import type { squareContract } from "../../../shared/contracts/square.ts";
import type { FeatureDeps } from "../../deps.ts";
import { getCurrentLayout, getLayout } from "../../event/square.queries.ts";
import type { Handlers } from "../../http/mount.ts";
import { presentLayout } from "./square.service.ts";

/** The handlers of the square contract. */
export function createSquareHandlers({ db }: FeatureDeps): Handlers<typeof squareContract> {
  return {
    current: () => presentLayout(db, getCurrentLayout(db)),
    layout: ({ params }) => presentLayout(db, getLayout(db, params.layoutId)),
  };
}
