import { z } from "zod";

const flag = z.enum(["true", "false"]).transform((value) => value === "true");

/** Every setting of the server, read from the environment once. README's table lists the same names. */
const ConfigSchema = z.object({
  PORT: z.coerce.number().int().min(0).max(65_535).default(8120),
  HOST: z.string().default("127.0.0.1"),
  /** The address people type, for links and the cross-site check, without a slash at the end. */
  PUBLIC_URL: z.url().optional(),
  DATA_DIR: z.string().default("var"),
  LOG_LEVEL: z.enum(["fatal", "error", "warn", "info", "debug", "silent"]).default("info"),
  /** Addresses of proxies in front, as Express' `trust proxy` reads them; empty trusts none. */
  TRUST_PROXY: z.string().default(""),
  /** `__Host-` cookies need https; on plain http (a laptop, a test) this is false. */
  SECURE_COOKIES: flag.default(false),
  RUN_THREADS: z.coerce.number().int().min(1).max(16).default(2),
  /** Seed the demo world into an empty database. */
  DEMO_WORLD: flag.default(true),
});

export interface Config {
  readonly port: number;
  readonly host: string;
  readonly publicUrl: string | null;
  readonly dataDir: string;
  readonly logLevel: z.infer<typeof ConfigSchema>["LOG_LEVEL"];
  readonly trustProxy: string;
  readonly secureCookies: boolean;
  readonly runThreads: number;
  readonly demoWorld: boolean;
}

/**
 * Reads the settings. Throws an Error whose message lists every bad setting, one a line, and says
 * what was expected.
 */
export function parseConfig(env: Readonly<Record<string, string | undefined>>): Config {
  const set = Object.fromEntries(Object.entries(env).filter(([, value]) => value !== ""));
  const parsed = ConfigSchema.safeParse(set);
  if (!parsed.success) {
    const lines = parsed.error.issues.map((issue) => `  ${issue.path.join(".")}: ${issue.message}`);
    throw new Error(`The configuration can not be used:\n${lines.join("\n")}`);
  }
  const c = parsed.data;
  return {
    port: c.PORT,
    host: c.HOST,
    publicUrl: c.PUBLIC_URL ?? null,
    dataDir: c.DATA_DIR,
    logLevel: c.LOG_LEVEL,
    trustProxy: c.TRUST_PROXY,
    secureCookies: c.SECURE_COOKIES,
    runThreads: c.RUN_THREADS,
    demoWorld: c.DEMO_WORLD,
  };
}
