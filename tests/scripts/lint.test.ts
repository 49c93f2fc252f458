import path from "node:path";
import { ESLint } from "eslint";
import { describe, expect, it } from "vitest";

const root = path.resolve(__dirname, "../..");
const lint = new ESLint({ cwd: root, overrideConfigFile: path.join(root, "scripts/eslint.config.mjs") });

async function rulesBroken(file: string, code: string): Promise<(string | null)[]> {
  const [result] = await lint.lintText(code, { filePath: path.join(root, file) });
  return (result?.messages ?? []).map(({ ruleId }) => ruleId);
}

const lines = (count: number) => Array.from({ length: count }, (_, index) => `  console${index};`).join("\n");

describe("the lint rules", () => {
  it.each([
    [
      "a type assertion in lib",
      "lib/units/a.ts",
      "export const a = JSON.parse('1') as number;",
      "consistent-type-assertions",
    ],
    [
      "a type assertion in policies",
      "policies/a.ts",
      "export const a = JSON.parse('1') as number;",
      "consistent-type-assertions",
    ],
    ["a non-null assertion in lib", "lib/units/a.ts", "export const a = [1].at(0)!;", "no-non-null-assertion"],
    ["any, anywhere", "app/a.ts", "export const a: any = 1;", "no-explicit-any"],
    [
      "an expected type error in lib",
      "lib/units/a.ts",
      "// @ts-expect-error it is wrong\nexport const a = 1;",
      "ban-ts-comment",
    ],
    ["a barrel", "lib/units/a.ts", 'export * from "./b";', "no-restricted-syntax"],
    ["a default export in lib", "lib/units/a.ts", "export default 1;", "no-restricted-syntax"],
    ["a default export of a shared component", "app/_components/a.tsx", "export default 1;", "no-restricted-syntax"],
    [
      "a function over 50 lines in lib",
      "lib/units/a.ts",
      `export function a() {\n${lines(50)}\n}`,
      "max-lines-per-function",
    ],
    [
      "a component over 200 lines",
      "app/_components/a.tsx",
      `export function A() {\n${lines(200)}\n}`,
      "max-lines-per-function",
    ],
    ["a file over 300 lines", "lib/units/a.ts", "export const a = [\n" + "  1,\n".repeat(300) + "];", "max-lines"],
  ])("refuse %s", async (_, file, code, rule) => {
    expect((await rulesBroken(file, code)).join(" ")).toContain(rule);
  });

  it.each([
    ["as const in lib", "lib/units/a.ts", 'export const A = ["a", "b"] as const;'],
    ["a page's default export", "app/(workspace)/page.tsx", "export default function Page() {\n  return null;\n}"],
  ])("allow %s", async (_, file, code) => {
    expect(await rulesBroken(file, code)).toEqual([]);
  });
});
