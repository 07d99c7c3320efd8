import type { TestProject } from "vitest/node";
import { ensureClientBuild } from "../../../server/cli/client-build.ts";
import { startProduct } from "./product.ts";

declare module "vitest" {
  export interface ProvidedContext {
    address: string;
  }
}

/**
 * One product for all journeys: seeding the demo world is the slow part. JOURNEY_ADDRESS names a
 * running one instead, for work on the journeys themselves.
 */
export default async function setup(project: TestProject): Promise<(() => Promise<void>) | undefined> {
  const running = process.env["JOURNEY_ADDRESS"];
  if (running !== undefined) {
    project.provide("address", running);
    return undefined;
  }
  await ensureClientBuild((line) => console.log(line));
  const product = await startProduct();
  project.provide("address", product.address);
  return () => product.stop();
}
