/** A mistake of whoever typed the command: shown as it is, exit code 2. */
export class UsageError extends Error {
  override readonly name = "UsageError";
}

/** One command of `npm run -s duskbell -- <name>`. */
export interface Command {
  /** As typed, e.g. `user add`. */
  readonly name: string;
  readonly usage: string;
  readonly summary: string;
  /** Gives the exit code. Throws `UsageError` for bad input. */
  run(args: readonly string[], say: (line: string) => void): Promise<number>;
}

/** Options as `--name value` or `--flag`, and the rest in order. Throws `UsageError` naming a wrong option. */
export function parseOptions(
  args: readonly string[],
  known: { readonly values?: readonly string[]; readonly flags?: readonly string[] },
): { values: Map<string, string>; flags: Set<string>; rest: string[] } {
  const values = new Map<string, string>();
  const flags = new Set<string>();
  const rest: string[] = [];
  for (let i = 0; i < args.length; i++) {
    const arg = args[i] ?? "";
    const name = arg.slice(2);
    if (!arg.startsWith("--")) rest.push(arg);
    else if (known.flags?.includes(name)) flags.add(name);
    else if (known.values?.includes(name)) {
      const value = args[++i];
      if (value === undefined || value.startsWith("--")) throw new UsageError(`${arg} needs a value: ${arg} something`);
      values.set(name, value);
    } else {
      const all = [...(known.values ?? []), ...(known.flags ?? [])].map((each) => `--${each}`);
      throw new UsageError(
        `There is no option ${arg}. ${all.length > 0 ? `Options are ${all.join(", ")}.` : "This command has none."}`,
      );
    }
  }
  return { values, flags, rest };
}

/** The value of an option that has to be there. Throws `UsageError`. */
export function getValue(values: ReadonlyMap<string, string>, name: string, example: string): string {
  const value = values.get(name);
  if (value === undefined) throw new UsageError(`--${name} is missing. For example: --${name} ${example}`);
  return value;
}
