import { ESLint } from "eslint";
import path from "node:path";
import { describe, expect, it } from "vitest";

const root = path.resolve(import.meta.dirname, "..");
const eslint = new ESLint({ cwd: root });

/** The rules that stop `code` where it stands in for the file at `filePath`. */
async function rulesAgainst(filePath: string, code: string): Promise<(string | null)[]> {
  const [result] = await eslint.lintText(code, { filePath: path.join(root, filePath) });
  return result?.messages.map((message) => message.ruleId) ?? [];
}

const PATHS = "import-x/no-restricted-paths";

describe("an import against the arrows fails the lint", () => {
  it.each([
    ["shared/schemas/problem.ts", "../../server/config.ts", PATHS],
    ["shared/schemas/problem.ts", "../../src/ui/paths.ts", PATHS],
    ["shared/schemas/problem.ts", "express", "no-restricted-imports"],
    ["src/ui/paths.ts", "../../server/config.ts", PATHS],
    ["src/ui/paths.ts", "../offline/index.ts", PATHS],
    ["src/offline/account.ts", "../ui/paths.ts", PATHS],
    ["src/features/shed/shed-page.tsx", "../../app/routes.tsx", PATHS],
    ["src/features/shed/shed-page.tsx", "../account/sign-in-page.tsx", PATHS],
    ["server/config.ts", "../src/ui/paths.ts", PATHS],
    ["server/routes/api.ts", "../db/store.ts", PATHS],
    ["server/services/permissions.ts", "../routes/api.ts", PATHS],
    ["server/db/store.ts", "../services/services.ts", PATHS],
  ])("%s importing %s", { timeout: 60_000 }, async (filePath, imported, rule) => {
    expect(await rulesAgainst(filePath, `import "${imported}";\n`)).toContain(rule);
  });

  it("a clock in shared", { timeout: 60_000 }, async () => {
    const rules = await rulesAgainst("shared/schemas/problem.ts", "export const t = Date.now();\n");
    expect(rules).toContain("no-restricted-properties");
  });
});
