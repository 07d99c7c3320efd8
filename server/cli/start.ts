import { ensureClientBuild } from "./client-build.ts";
import { ensureNativeModule } from "./native-module.ts";

// `npm start`: whatever is missing is made first, then the server runs in this process.
const say = (line: string) => console.log(line);
try {
  // The compiler and the build of the pages each keep one core busy.
  await Promise.all([ensureNativeModule(say), ensureClientBuild(say)]);
} catch (error) {
  console.error(error instanceof Error ? error.message : error);
  process.exit(1);
}
await import("../main.ts");
