// The import rules of docs/architecture: `shared` stands alone; `src` and `server` never meet;
// app → features → offline, ui; routes → services → db; no cycles.
import js from "@eslint/js";
import { createTypeScriptImportResolver } from "eslint-import-resolver-typescript";
import importX from "eslint-plugin-import-x";
import reactHooks from "eslint-plugin-react-hooks";
import globals from "globals";
import { readdirSync } from "node:fs";
import tseslint from "typescript-eslint";

/** Files under `target` may not import files under `from`. */
const zone = (target, from, message) => ({ target, from, message });
const features = readdirSync("src/features", { withFileTypes: true })
  .filter((entry) => entry.isDirectory())
  .map((entry) => `./src/features/${entry.name}`);

const zones = [
  zone("./shared", ["./src", "./server"], "shared imports only itself."),
  zone("./shared/**/!(*.test).ts", "./tests", "shared imports only itself."),
  zone("./src", "./server", "The client never imports the server."),
  zone("./server", "./src", "The server never imports the client."),
  zone("./src/features", "./src/app", "Features do not know the app that holds them."),
  zone(
    "./src/offline",
    ["./src/app", "./src/features", "./src/ui"],
    "offline stands on shared alone.",
  ),
  zone("./src/ui", ["./src/app", "./src/features", "./src/offline"], "ui stands on shared alone."),
  zone("./server/services", "./server/routes", "Services know nothing of HTTP."),
  zone("./server/db", ["./server/routes", "./server/services"], "db knows tables only."),
  zone("./server/routes", "./server/db", "Routes call services, never the database."),
  ...features.map((feature) => ({
    ...zone(feature, "./src/features", "No feature imports another."),
    except: [`./${feature.split("/").pop()}`],
  })),
];

export default tseslint.config(
  { ignores: ["dist", "node_modules", "data", "coverage", "test-results", "drizzle"] },
  js.configs.recommended,
  tseslint.configs.recommendedTypeChecked,
  {
    languageOptions: {
      parserOptions: {
        projectService: { allowDefaultProject: ["*.js", "public/*.js"] },
        tsconfigRootDir: import.meta.dirname,
      },
      globals: { ...globals.node },
    },
    plugins: { "import-x": importX },
    settings: {
      "import-x/resolver-next": [createTypeScriptImportResolver({ project: "tsconfig.base.json" })],
    },
    rules: {
      "import-x/no-restricted-paths": ["error", { zones }],
      "import-x/no-cycle": ["error", { ignoreExternal: true }],
      "no-console": "off",
      "@typescript-eslint/no-unused-vars": [
        "error",
        { argsIgnorePattern: "^_", varsIgnorePattern: "^_" },
      ],
      "@typescript-eslint/consistent-type-imports": "error",
    },
  },
  {
    files: ["src/**/*.{ts,tsx}"],
    plugins: { "react-hooks": reactHooks },
    languageOptions: { globals: { ...globals.browser } },
    rules: reactHooks.configs.recommended.rules,
  },
  {
    files: ["shared/**/*.ts"],
    ignores: ["shared/**/*.test.ts"],
    rules: {
      "no-restricted-imports": [
        "error",
        {
          patterns: [
            {
              regex: "^(?!\\.{1,2}/|zod$|date-fns|@stdlib/)",
              message: "shared imports only zod, date-fns, the statistics library and itself.",
            },
          ],
        },
      ],
      "no-restricted-properties": [
        "error",
        { object: "Date", property: "now", message: "shared has no clock." },
        { object: "Math", property: "random", message: "shared has no randomness." },
      ],
      "no-restricted-syntax": [
        "error",
        {
          selector: "NewExpression[callee.name='Date'][arguments.length=0]",
          message: "shared has no clock.",
        },
      ],
      "no-restricted-globals": ["error", "fetch", "process", "localStorage", "window", "document"],
    },
  },
  {
    // Playwright reads a fixture's needs from its first argument's pattern, also where it has none.
    files: ["tests/browser/**/*.ts"],
    rules: { "no-empty-pattern": ["error", { allowObjectPatternsAsParameters: true }] },
  },
  { files: ["**/*.js"], ...tseslint.configs.disableTypeChecked },
  { files: ["public/*.js"], languageOptions: { globals: globals.browser } },
);
