/**
 * The settings of the engine, equal on every host. Changing one changes which scripts run, so it
 * needs a new language number.
 */

/** Pages (64 KiB) of the WebAssembly memory, initial and maximum: 40 MiB that never grow. Growing memory made disposing abort. */
export const WASM_MEMORY_PAGES = 640;
/** What the guest may allocate, below the fixed memory. */
export const GUEST_MEMORY_BYTES = 24 * 1024 * 1024;
/** The guest's own stack: above 32 KiB a worker of Chromium overflows its host stack first. */
export const GUEST_STACK_BYTES = 32 * 1024;
/** Interpreter polls (10 000 steps each) of one run. */
export const FUEL_LIMIT = 1000;
/** Polls for handing out the result of a run that was stopped. */
export const REPORT_FUEL = 400;
/** Jobs run in one go between two looks at the fuel. */
export const JOBS_PER_SLICE = 200;
/** Characters of the report that a host reads. */
export const MAX_REPORT_LENGTH = 4_000_000;
