import { readdirSync } from "node:fs";
import path from "node:path";
import { describe, expect, it } from "vitest";

const root = path.resolve(__dirname, "../..");
const FOLDERS = ["app", "lib", "models", "policies", "scripts", "templates", "tests"];

const entries = FOLDERS.flatMap((folder) =>
  readdirSync(path.join(root, folder), { recursive: true, withFileTypes: true }).map((entry) => ({
    name: entry.name,
    where: path.relative(root, path.join(entry.parentPath, entry.name)),
  })),
);

/** Kebab-case, with the marks Next gives a meaning to in folders of app: [parameter], (group), _private. */
const KEBAB = /^[a-z0-9]+(-[a-z0-9]+)*(\.[a-z0-9-]+)*$/;
const ROUTE_FOLDER = /^(\[(\.\.\.)?[a-zA-Z]+\]|\([a-z-]+\)|_[a-z-]+)$/;

describe("the tree", () => {
  it("names files and folders in kebab-case", () => {
    const allowed = ({ name, where }: { name: string; where: string }) =>
      KEBAB.test(name) || name === "README.md" || (/^(tests\/)?app\//.test(where) && ROUTE_FOLDER.test(name));
    expect(entries.filter((entry) => !allowed(entry)).map(({ where }) => where)).toEqual([]);
  });

  it("has no file that hides where things live, and none without a subject", () => {
    const nameless = /^(index|utils?|helpers?|misc|services?|common)(\.(ts|tsx|mjs))?$/;
    expect(entries.filter(({ name }) => nameless.test(name)).map(({ where }) => where)).toEqual([]);
  });
});
