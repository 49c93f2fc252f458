import { createHash } from "node:crypto";
import { gunzipSync, gzipSync } from "node:zlib";
import { beforeEach, describe, expect, it, vi } from "vitest";
import { GET } from "@/app/api/products/[productCode]/budget/route";
import { differingSheets } from "@/lib/budget/differing-sheets";
import { sheetAsText } from "@/lib/budget/kept-sheets";
import { loadBudget, productByCode } from "@/lib/budget/load-budget";
import { loadUncertainty } from "@/lib/budget/load-uncertainty";
import { sheetsOf } from "@/lib/budget/sheet-data";
import type { Actor } from "@/lib/vocabulary/actor";
import { database, inSnapshot, inTransaction } from "@/models/database";
import { IssueSheet } from "@/models/issue-sheet";
import { withDatabase } from "@/tests/support/database";
import { person, product } from "@/tests/support/people";
import { type Cast, cast, Q, threeIssues } from "@/tests/support/three-issues";

let signedIn: Actor | null = null;
vi.mock("@/app/_server/session", () => ({ currentActor: () => Promise.resolve(signedIn) }));

withDatabase();

let people: Cast;
beforeEach(async () => {
  people = await cast();
  await threeIssues(people);
  signedIn = people.ines;
});

function ask(query: string, headers: Record<string, string> = {}, productCode = "TF-2"): Promise<Response> {
  const request = new Request(`http://127.0.0.1/api/products/${productCode}/budget?${query}`, { headers });
  return GET(request, { params: Promise.resolve({ productCode }) });
}

/** What the tables give when they are asked anew. */
async function liveText(issue: number): Promise<string> {
  return inSnapshot(async (tx) => {
    const { id } = await productByCode("TF-2", tx);
    const { state, results } = await loadBudget(id, issue, tx);
    const [sheet] = sheetsOf({ issue, state, results, uncertainty: await loadUncertainty(id, issue, tx) });
    if (!sheet) throw new Error("a budget has an operating point");
    return sheetAsText(sheet);
  });
}

const textOf = async (answer: Response) => gunzipSync(await answer.arrayBuffer()).toString("utf8");
const hashOf = (text: string) => createHash("sha256").update(text).digest("hex");

describe("the data of a budget sheet", () => {
  it("is, byte for byte, what the tables give for that issue, whatever came after it", async () => {
    for (const issue of [1, 2, 3]) {
      const answer = await ask(`issue=${issue}&point=OP-1`);

      expect(answer.status).toBe(200);
      expect(await textOf(answer)).toBe(await liveText(issue));
    }
  });

  it("holds the rows of the chosen operating point with the numbers of the issue", async () => {
    const sheet = JSON.parse(await textOf(await ask("issue=2&point=OP-1")));

    // D = q · C_D · A by hand; 0.5 on 0.2 m².
    expect(sheet.rows[0]).toMatchObject({ number: "010", letter: "–", ownerId: people.tansy.userId });
    expect(sheet.rows[0].basic).toBeCloseTo(Q * 0.5 * 0.2, 9);
    expect(sheet.points).toHaveLength(1);
    expect(sheet.points[0]).not.toHaveProperty("items");
  });

  it("has a strong tag and is not sent again to whoever names it", async () => {
    const answer = await ask("issue=3&point=OP-1");
    const tag = `"${hashOf(await textOf(answer))}"`;

    expect(answer.headers.get("etag")).toBe(tag);
    expect(answer.headers.get("content-type")).toBe("application/gzip");
    expect(answer.headers.get("cache-control")).toBe("private, no-cache, no-transform");

    const again = await ask("issue=3&point=OP-1", { "if-none-match": `"another", ${tag}` });
    expect(again.status).toBe(304);
    expect(await again.text()).toBe("");
    expect(again.headers.get("etag")).toBe(tag);
  });

  it("is sent whole to who names another issue's tag, or a weak one", async () => {
    const earlier = (await ask("issue=2&point=OP-1")).headers.get("etag") ?? "";
    const own = (await ask("issue=3&point=OP-1")).headers.get("etag") ?? "";

    expect((await ask("issue=3&point=OP-1", { "if-none-match": earlier })).status).toBe(200);
    expect((await ask("issue=3&point=OP-1", { "if-none-match": `W/${own}` })).status).toBe(200);
  });

  it("is refused to who has no session or no role here, even if they name its tag", async () => {
    const tag = (await ask("issue=3&point=OP-1")).headers.get("etag") ?? "";
    await product("OTHER");
    signedIn = await person("Otto Elsewhere");
    expect((await ask("issue=3&point=OP-1", { "if-none-match": tag })).status).toBe(403);

    signedIn = null;
    expect((await ask("issue=3&point=OP-1", { "if-none-match": tag })).status).toBe(401);
  });

  it("is not found for another product, an issue to come or an operating point that is none", async () => {
    expect((await ask("issue=3&point=OP-1", {}, "NONE")).status).toBe(404);
    expect((await ask("issue=4&point=OP-1")).status).toBe(404);
    expect((await ask("issue=3&point=OP-9")).status).toBe(404);
    expect((await ask("issue=three&point=OP-1")).status).toBe(400);
  });

  it("is made at its first read where an older version wrote the issue, and then stays", async () => {
    await inTransaction(async (tx) => {
      // As a database looks that was brought up to date.
      await database.query("DROP TRIGGER issue_sheets_never_deleted", { transaction: tx });
      await IssueSheet.destroy({ where: {}, transaction: tx });
    });

    expect(await textOf(await ask("issue=2&point=OP-1"))).toBe(await liveText(2));
    expect(await IssueSheet.count()).toBe(1);
    await ask("issue=2&point=OP-1");
    expect(await IssueSheet.count()).toBe(1);
  });
});

describe("the table of kept sheets", () => {
  it("lets no row be changed or deleted", async () => {
    await expect(
      inTransaction((tx) => IssueSheet.update({ sha256: "0".repeat(64) }, { where: {}, transaction: tx })),
    ).rejects.toThrow();
    await expect(inTransaction((tx) => IssueSheet.destroy({ where: {}, transaction: tx }))).rejects.toThrow();
  });

  it("is found out where somebody altered it behind its back", async () => {
    const differing = async (issue: number) =>
      inSnapshot(async (tx) => differingSheets((await productByCode("TF-2", tx)).id, issue, tx));
    expect([await differing(2), await differing(3)]).toEqual([[], []]);

    const forged = (await liveText(3)).replace('"issue":3', '"issue":9');
    await inTransaction(async (tx) => {
      await database.query("DROP TRIGGER issue_sheets_never_changes", { transaction: tx });
      const row = { bytes: gzipSync(forged), sha256: hashOf(forged) };
      await IssueSheet.update(row, { where: { issue: 3 }, transaction: tx });
    });
    expect([await differing(2), await differing(3)]).toEqual([[], ["OP-1"]]);
  });
});
