import path from "node:path";
import { describe, expect, it } from "vitest";
import { checkCredentials } from "@/lib/users/check-credentials";
import { listAccounts } from "@/lib/users/queries";
import { closeDatabase, openDatabase } from "@/models/database";
import { finishedProgram } from "@/tests/support/finished-program";
import { temporaryTree } from "@/tests/support/temporary-tree";

/** What the start does with the database of an installation without demo. */
function prepare(dataFolder: string, adminEmail: string | null) {
  const program = `
    import { prepareDatabase } from "./scripts/start/database.mjs";
    await prepareDatabase({ dataFolder: ${JSON.stringify(dataFolder)}, demo: false, adminEmail: ${JSON.stringify(adminEmail)} })
      .catch((error) => { console.error(error.message); process.exitCode = 1; });`;
  return finishedProgram(["--input-type=module", "--eval", program]);
}

describe("an installation without the demo", () => {
  it("asks for the address of its first administrator", { timeout: 120_000 }, async () => {
    const { code, output } = await prepare(temporaryTree(), null);
    expect(code).toBe(1);
    expect(output).toContain("set LEEBOARD_ADMIN_EMAIL to their address and start again.");
  });

  it(
    "makes that account, prints its password once, and keeps everything afterwards",
    { timeout: 120_000 },
    async () => {
      const dataFolder = temporaryTree();
      const first = await prepare(dataFolder, "ada@example.org");
      expect(first.code).toBe(0);
      const password = /ada@example\.org, password (\S+)/.exec(first.output)?.[1] ?? "";
      expect(password.length).toBeGreaterThanOrEqual(20);

      const second = await prepare(dataFolder, "ada@example.org");
      expect(second).toMatchObject({ code: 0, output: "" });

      await openDatabase(path.join(dataFolder, "leeboard.sqlite"));
      try {
        expect(await listAccounts()).toMatchObject([{ email: "ada@example.org", isAdministrator: true, active: true }]);
        expect((await checkCredentials("ada@example.org", password)).valid).toBe(true);
      } finally {
        await closeDatabase();
      }
    },
  );
});
