export { buildDeclarations } from "./build.ts";
export { LIBRARY_DECLARATIONS } from "./lib.ts";
