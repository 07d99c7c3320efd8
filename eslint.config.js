import jsxA11y from "eslint-plugin-jsx-a11y";
import reactHooks from "eslint-plugin-react-hooks";
import tseslint from "typescript-eslint";

/** A ban names its replacement. */
const bannedGlobals = (...entries) => ({ "no-restricted-globals": ["error", ...entries] });

export default tseslint.config(
  {
    ignores: [
      "dist/",
      "var/",
      "node_modules/",
      "drizzle/",
      "coverage/",
      "tests/samples/",
      "**/*.generated.ts",
      "server/db/seed/world/scripts/**/*.show.ts",
    ],
  },
  ...tseslint.configs.recommendedTypeChecked,
  {
    languageOptions: {
      parserOptions: {
        project: ["tsconfig.sandbox.json", "tsconfig.src.json", "tsconfig.server.json", "tsconfig.tests.json"],
        tsconfigRootDir: import.meta.dirname,
      },
    },
    linterOptions: { reportUnusedDisableDirectives: "error" },
    rules: {
      "max-lines": ["error", { max: 400, skipBlankLines: true, skipComments: true }],
      "no-console": "error",
      eqeqeq: "error",
      "@typescript-eslint/consistent-type-imports": "error",
      "@typescript-eslint/no-explicit-any": "error",
      "@typescript-eslint/no-non-null-assertion": "error",
      "@typescript-eslint/switch-exhaustiveness-check": ["error", { considerDefaultExhaustiveForUnions: true }],
      "@typescript-eslint/restrict-template-expressions": ["error", { allowNumber: true }],
      "@typescript-eslint/no-unused-vars": ["error", { argsIgnorePattern: "^_", varsIgnorePattern: "^_" }],
      "@typescript-eslint/only-throw-error": ["error", { allow: ["Response"] }],
      "@typescript-eslint/no-misused-promises": ["error", { checksVoidReturn: { attributes: false } }],
    },
  },
  {
    // Texts of scripts, one after another: nothing in them is easier to read in pieces.
    files: ["tests/novice/{right,wrong}-scripts.ts"],
    rules: { "max-lines": "off" },
  },
  {
    files: ["sandbox/**/*.ts"],
    rules: {
      "max-lines": ["error", { max: 600, skipBlankLines: true, skipComments: true }],
      ...bannedGlobals(
        { name: "Date", message: "A show has no wall clock: pass the moment in." },
        { name: "setTimeout", message: "The sandbox is synchronous: the host schedules." },
      ),
      "no-restricted-properties": [
        "error",
        { object: "Math", property: "random", message: "Use a seeded stream: the same input gives the same bytes." },
      ],
    },
  },
  {
    files: ["sandbox/language/**/*.ts", "sandbox/checks/**/*.ts", "sandbox/course/**/*.ts"],
    rules: {
      // The compiler's node guards (ts.isCallExpression) and kinds are typed as methods and enums; both are plain values.
      "@typescript-eslint/unbound-method": "off",
      "@typescript-eslint/no-unsafe-enum-comparison": "off",
    },
  },
  {
    files: ["sandbox/engine/library/**/*.ts"],
    rules: {
      // The library takes built-ins apart, replaces Math.random by the show's luck, and throws a mark that no script can catch or read.
      "@typescript-eslint/unbound-method": "off",
      "@typescript-eslint/only-throw-error": "off",
      "no-restricted-properties": "off",
    },
  },
  {
    files: ["server/features/**/*.ts", "server/http/**/*.ts", "server/show-runs/**/*.ts"],
    ignores: ["**/*.test.ts"],
    rules: {
      "no-restricted-properties": [
        "error",
        { object: "Date", property: "now", message: "Use the injected clock (deps.clock.now())." },
      ],
    },
  },
  {
    files: ["src/**/*.{ts,tsx}"],
    plugins: { "react-hooks": reactHooks, "jsx-a11y": jsxA11y },
    rules: {
      ...reactHooks.configs.recommended.rules,
      ...jsxA11y.flatConfigs.recommended.rules,
      // react-aria components carry their own roles; `autoFocus` is used where a dialog opens.
      "jsx-a11y/no-autofocus": "off",
      ...bannedGlobals({ name: "fetch", message: "Call the API with callApi(contract.endpoint, ...)." }),
    },
  },
  { files: ["src/lib/api-client.ts"], rules: { "no-restricted-globals": "off" } },
  {
    files: ["server/cli/**/*.ts", "server/main.ts", "tests/**/*.ts"],
    // These talk to a person at a terminal.
    rules: { "no-console": "off" },
  },
  {
    files: ["**/*.test.{ts,tsx}", "tests/**/*.ts"],
    rules: {
      // supertest bodies and page.evaluate results are unknown JSON by nature; tests assert their values.
      "@typescript-eslint/no-unsafe-assignment": "off",
      "@typescript-eslint/no-unsafe-member-access": "off",
      "@typescript-eslint/no-unsafe-argument": "off",
      "@typescript-eslint/no-unsafe-call": "off",
      "@typescript-eslint/no-unsafe-return": "off",
      "@typescript-eslint/no-non-null-assertion": "off",
      "@typescript-eslint/unbound-method": "off",
      "no-restricted-globals": "off",
    },
  },
  { files: ["eslint.config.js", ".dependency-cruiser.mjs", "src/public/*.js"], ...tseslint.configs.disableTypeChecked },
);
