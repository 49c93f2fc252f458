import { describe, expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { verifyChain } from "@/lib/audit/verify-chain";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import { createAccount } from "@/lib/products/create-account";
import { establishProduct } from "@/lib/products/establish-product";
import { establishWarnings, registerFor } from "@/lib/products/queries";
import { EstablishProductInput } from "@/lib/products/schema";
import { hashPassword } from "@/lib/users/password";
import type { Actor } from "@/lib/vocabulary/actor";
import { Issue } from "@/models/issue";
import { LineRevision } from "@/models/line-revision";
import { Signature } from "@/models/signature";
import { firstPoint, newestBudget } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { person, product, withRole } from "@/tests/support/people";

withDatabase();

const PASSWORD = "north wind and spray";
const CLOCK = () => new Date("2026-03-02T08:00:00.000Z");

const input = (password = PASSWORD, limit: number | null = 6600) =>
  EstablishProductInput.parse({
    productCode: "TF-2",
    operatingPoint: { number: "OP-1", body: { ...firstPoint(1), limitHundredths: limit } },
    terms: newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: 300 }),
    password,
  });

async function manager(name = "Lusia Brand"): Promise<Actor> {
  // A cheap cost: what is tested here is the act, not the strength of the hash.
  const passwordHash = await hashPassword(PASSWORD, { logN: 10, r: 8, p: 1 });
  return withRole(await person(name, { passwordHash }), "TF-2", "program_manager");
}

describe("establishing a product", () => {
  it("makes issue 1 with the signature of one program manager, and warns that there is only one", async () => {
    await product("TF-2");
    const lusia = await manager();
    const established = await establishProduct(lusia, input(), CLOCK);

    expect(established).toMatchObject({ issue: 1, warnings: [/one program manager/, /no reviewer/].map(matching) });
    const budget = await newestBudget("TF-2");
    expect(budget.issue).toBe(1);
    expect(budget.results.points).toMatchObject([
      { operatingPoint: "OP-1", limitHundredths: 6600, reserveHundredths: 300, standing: "inside" },
    ]);
    expect(await Signature.findAll({ raw: true })).toMatchObject([
      { subjectType: "establishment", signerId: lusia.userId, printedName: "Lusia Brand", capacity: "program_manager" },
    ]);
    const { canonicalText } = await Signature.findOne({ rejectOnEmpty: true });
    expect(canonicalText).toContain(established.contentHash);
    expect(canonicalText).toContain("limitHundredths: 6600 hundredths of N");
  });

  it("stands once in the history with the hash of its content, and the chain fits", async () => {
    await product("TF-2");
    const { contentHash } = await establishProduct(await manager(), input(), CLOCK);
    expect((await historyPage({ chain: "TF-2", act: "establish_product" })).rows).toMatchObject([
      { act: "establish_product", outcome: "done", capacity: "program_manager", now: { issue: 1, contentHash } },
    ]);
    expect(await verifyChain("TF-2")).toMatchObject({ faults: [] });
  });

  it("happens once: the second try is refused as a wrong state", async () => {
    await product("TF-2");
    const lusia = await manager();
    await establishProduct(lusia, input(), CLOCK);
    await expect(establishProduct(lusia, input(), CLOCK)).rejects.toMatchObject({ code: "wrong_state" });
    expect(await Issue.count()).toBe(1);
  });

  it.each([
    ["a wrong password", input("not my password"), "wrong_password", 1],
    ["a limit that is missing", input(PASSWORD, null), "invalid", 0],
  ])("is refused with %s and leaves nothing behind", async (_name, wrong, code, entries) => {
    await product("TF-2");
    const lusia = await manager();
    await expect(establishProduct(lusia, wrong, CLOCK)).rejects.toMatchObject({ code });
    expect([await Issue.count(), await LineRevision.count(), await Signature.count()]).toEqual([0, 0, 0]);
    const { rows } = await historyPage({ chain: "TF-2", act: "establish_product" });
    expect(rows.map(({ outcome }) => outcome)).toEqual(Array.from({ length: entries }, () => "refused"));
  });

  it("is refused to a reviewer and to an administrator without role", async () => {
    await product("TF-2");
    const reviewer = await withRole(await person("Ines Maat"), "TF-2", "reviewer");
    const admin = await person("Anke Post", { isAdministrator: true });
    for (const other of [reviewer, admin]) {
      await expect(establishProduct(other, input(), CLOCK)).rejects.toMatchObject({ code: "forbidden" });
    }
    expect(await Issue.count()).toBe(0);
  });

  it("no longer warns when there are two program managers and a reviewer", async () => {
    await product("TF-2");
    const lusia = await manager();
    await withRole(await person("Fenno Vries"), "TF-2", "program_manager");
    await withRole(await person("Ines Maat"), "TF-2", "reviewer");
    expect(await establishWarnings(lusia, "TF-2", CLOCK().toISOString())).toEqual([]);
  });
});

describe("the register", () => {
  it("shows a person the products they hold a role in, an administrator all of them without their budgets", async () => {
    await product("TF-2");
    await product("PD-7", "duct");
    const lusia = await manager();
    await establishProduct(lusia, input(), CLOCK);
    const admin = await person("Anke Post", { isAdministrator: true });

    expect(await registerFor(lusia)).toMatchObject([
      {
        product: { code: "TF-2", newestIssue: 1 },
        roles: ["program_manager"],
        worst: { operatingPoint: "OP-1", predicted: 0, limit: 66, margin: 66, standing: "inside" },
        openProposals: 0,
      },
    ]);
    expect(await registerFor(admin)).toMatchObject([
      { product: { code: "PD-7", newestIssue: null }, roles: [], worst: null },
      { product: { code: "TF-2", newestIssue: 1 }, roles: [], worst: null },
    ]);
    expect(await registerFor(await person("Nobody Here"))).toEqual([]);
  });
});

describe("an account", () => {
  const asked = { email: "ines@example.org", name: "Ines Maat", password: PASSWORD, isAdministrator: false };

  it("is made by an administrator, once for an address", async () => {
    const admin = await person("Anke Post", { isAdministrator: true });
    await createAccount(admin, asked, CLOCK);
    await expect(createAccount(admin, asked, CLOCK)).rejects.toMatchObject({ code: "duplicate" });
    expect((await historyPage({ chain: "house" })).rows.map(({ act }) => act)).toEqual(["create_account"]);
  });

  it("is refused to anybody else", async () => {
    await expect(createAccount(await person("Tom Veer"), asked, CLOCK)).rejects.toMatchObject({ code: "forbidden" });
  });
});

function matching(pattern: RegExp): unknown {
  return expect.stringMatching(pattern);
}
