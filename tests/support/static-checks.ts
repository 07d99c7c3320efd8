/** A check that is a program of its own: a module for Node with its arguments. */
export interface StaticCheck {
  readonly name: string;
  readonly args: readonly string[];
}

const tsc = (project: string): StaticCheck => ({
  name: `types: ${project}`,
  args: ["node_modules/typescript/bin/tsc", "-p", `tsconfig.${project}.json`],
});

/** All static checks of `npm test`, the longest first. */
export const STATIC_CHECKS: readonly StaticCheck[] = [
  { name: "lint", args: ["node_modules/eslint/bin/eslint.js", ".", "--max-warnings=0"] },
  tsc("tests"),
  tsc("server"),
  tsc("src"),
  { name: "format", args: ["node_modules/prettier/bin/prettier.cjs", "--check", "--log-level=warn", "."] },
  tsc("sandbox"),
  {
    name: "arrows",
    args: [
      "node_modules/dependency-cruiser/bin/dependency-cruise.mjs",
      "src",
      "server",
      "sandbox",
      "shared",
      "lessons",
      "--config",
      ".dependency-cruiser.mjs",
    ],
  },
  { name: "unused code", args: ["node_modules/knip/bin/knip.js"] },
  { name: "migrations match the schema", args: ["node_modules/drizzle-kit/bin.cjs", "check"] },
];
