import { spawn } from "node:child_process";

/** How a program ended, with all that it printed. */
export interface QuietEnd {
  readonly isOk: boolean;
  readonly output: string;
}

/** Runs a program to its end without showing what it prints. A program that is not there ends badly, too. */
export function runQuietly(program: string, args: readonly string[], folder?: string): Promise<QuietEnd> {
  return new Promise((resolve) => {
    const child = spawn(program, args, { cwd: folder, stdio: ["ignore", "pipe", "pipe"] });
    let output = "";
    const keep = (chunk: Buffer) => {
      output += chunk.toString();
    };
    child.stdout.on("data", keep);
    child.stderr.on("data", keep);
    child.once("error", (error) => resolve({ isOk: false, output: error.message }));
    child.once("close", (code) => resolve({ isOk: code === 0, output }));
  });
}
