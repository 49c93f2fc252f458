import { QueryTypes } from "sequelize";
import { describe, expect, it } from "vitest";
import { verifyChain } from "@/lib/audit/verify-chain";
import { propose } from "@/lib/proposals/submitting/propose";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { signProposal } from "@/lib/proposals/signing/sign-proposal";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { database } from "@/models/database";
import { withDatabase } from "@/tests/support/database";
import { adding, approval, approves, CODE, content, formKey, proposed, team } from "./review-cycle";

withDatabase();

/** Every row of every table. */
async function wholeFile(): Promise<Record<string, unknown[]>> {
  const tables = await database.query<{ name: string }>(
    "SELECT name FROM sqlite_master WHERE type = 'table' AND name NOT LIKE 'sqlite_%'",
    { type: QueryTypes.SELECT },
  );
  const file: Record<string, unknown[]> = {};
  for (const { name } of tables) {
    file[name] = await database.query(`SELECT * FROM ${name} ORDER BY 1`, { type: QueryTypes.SELECT });
  }
  return file;
}

/** Runs an act again and again with its n-th statement failing, for every n, and once to the end. */
async function brokenEverywhere<T>(act: () => Promise<T>): Promise<{ broken: number; value: T }> {
  const query = database.query;
  const before = await wholeFile();
  for (let n = 1; ; n += 1) {
    let statements = 0;
    let isBroken = false;
    database.query = new Proxy(query, {
      apply(target, self, parameters: unknown[]) {
        statements += 1;
        if (statements !== n) return Reflect.apply(target, self, parameters);
        isBroken = true;
        return Promise.reject(new Error(`statement ${n} was broken`));
      },
    });
    const [outcome] = await Promise.allSettled([act()]);
    database.query = query;
    if (!isBroken && outcome.status === "fulfilled") return { broken: n - 1, value: outcome.value };
    expect(outcome, `statement ${n}`).toMatchObject({ reason: { message: `statement ${n} was broken` } });
    expect(await wholeFile(), `after statement ${n}`).toEqual(before);
  }
}

describe("an act is whole or absent, wherever it is broken", () => {
  it("leaves nothing of a last signature that failed at any statement, and a second try works", async () => {
    const { tansy, ines, lusia, clock } = await team();
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    await approves(ines, proposalId, "reviewer", clock);
    const sheet = await approval(proposalId, "program_manager", clock);
    const { broken, value } = await brokenEverywhere(() => signProposal(lusia, sheet, clock));
    expect(broken).toBeGreaterThan(30);
    expect(value).toEqual({ state: "approved", issue: 2 });
    expect(await verifyChain(CODE)).toMatchObject({ faults: [] });
  }, 120_000);

  it("leaves nothing of a submission that failed at any statement, and the number is given once", async () => {
    const { tansy, clock } = await team();
    const { proposalId } = await startDraft(tansy, { productCode: CODE, title: "", key: formKey() }, clock);
    const typed = content({ edits: [adding("010", tansy.userId, 0.5)] });
    await saveDraft(tansy, { proposalId, lockVersion: 0, content: typed }, clock);
    const input = { proposalId, lockVersion: 1, key: formKey(), password: null };
    const { value } = await brokenEverywhere(() => propose(tansy, input, clock));
    expect(value).toEqual({ key: "1", number: 1, round: 1 });
    expect(await verifyChain(CODE)).toMatchObject({ faults: [] });
  }, 120_000);
});
