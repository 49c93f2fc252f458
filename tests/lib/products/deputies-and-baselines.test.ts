import { describe, expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { verifyChain } from "@/lib/audit/verify-chain";
import { deputiesOn } from "@/lib/budget/members";
import { issuesOf } from "@/lib/budget/queries";
import { endDeputy } from "@/lib/products/end-deputy";
import { makeBaseline } from "@/lib/products/make-baseline";
import { nameDeputy } from "@/lib/products/name-deputy";
import { deputiesOf } from "@/lib/products/queries";
import { NameDeputyInput } from "@/lib/products/schema";
import { hashPassword } from "@/lib/users/password";
import { inSnapshot } from "@/models/database";
import { Baseline } from "@/models/baseline";
import { Deputy } from "@/models/deputy";
import { Signature } from "@/models/signature";
import { establish } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { person, product, withRole } from "@/tests/support/people";

withDatabase();

const PASSWORD = "north wind and spray";
const CLOCK = () => new Date("2026-05-10T08:00:00.000Z");
const MAY = { productCode: "TF-2", fromDay: "2026-05-11", untilDay: "2026-05-15" };

async function cast() {
  const productId = await product("TF-2");
  const passwordHash = await hashPassword(PASSWORD, { logN: 10, r: 8, p: 1 });
  const lusia = await withRole(await person("Lusia Brand", { passwordHash }), "TF-2", "program_manager");
  const tansy = await withRole(await person("Tansy Merle", { passwordHash }), "TF-2", "component_owner");
  const maud = await withRole(await person("Maud Aldert"), "TF-2", "auditor");
  return { productId, lusia, tansy, maud };
}

describe("a deputy", () => {
  it("stands in on the named days, both included, and no longer once ended", async () => {
    const { productId, lusia, tansy } = await cast();
    const { deputyshipId } = await nameDeputy(lusia, { ...MAY, deputyId: tansy.userId }, CLOCK);
    const on = (day: string) => inSnapshot((tx) => deputiesOn(productId, day, tx));
    const named = [{ deputyId: tansy.userId, forUserId: lusia.userId }];
    expect([await on("2026-05-10"), await on("2026-05-11"), await on("2026-05-15"), await on("2026-05-16")]).toEqual([
      [],
      named,
      named,
      [],
    ]);
    await expect(endDeputy(tansy, { deputyshipId }, CLOCK)).rejects.toMatchObject({ code: "forbidden" });
    await endDeputy(lusia, { deputyshipId }, CLOCK);
    expect(await on("2026-05-12")).toEqual([]);
    expect(await deputiesOf(tansy, "TF-2")).toMatchObject([
      { holder: { name: "Lusia Brand" }, deputy: { name: "Tansy Merle" }, endedAt: "2026-05-10T08:00:00.000Z" },
    ]);
    const acts = (await historyPage({ chain: "TF-2" })).rows.map(({ act, outcome }) => `${act} ${outcome}`);
    expect(acts.slice(0, 3)).toEqual(["end_deputy done", "end_deputy refused", "name_deputy done"]);
  });

  it("is another person who takes part here, on days that have not passed", async () => {
    const { lusia, tansy, maud } = await cast();
    const stranger = await person("Someone Else");
    const refusedAt = (path: string) => ({ code: "invalid", faults: [{ path }] });
    for (const deputyId of [lusia.userId, maud.userId, stranger.userId]) {
      await expect(nameDeputy(lusia, { ...MAY, deputyId }, CLOCK)).rejects.toMatchObject(refusedAt("deputyId"));
    }
    const past = { ...MAY, fromDay: "2026-05-01", untilDay: "2026-05-09", deputyId: tansy.userId };
    await expect(nameDeputy(lusia, past, CLOCK)).rejects.toMatchObject(refusedAt("untilDay"));
    await expect(nameDeputy(tansy, { ...MAY, deputyId: lusia.userId }, CLOCK)).rejects.toMatchObject({
      code: "forbidden",
    });
    expect(await Deputy.count()).toBe(0);
    expect(NameDeputyInput.safeParse({ ...MAY, untilDay: "2026-05-10", deputyId: 1 }).success).toBe(false);
  });
});

describe("a baseline", () => {
  const asked = {
    productCode: "TF-2",
    issue: 1,
    name: "Preliminary design",
    purpose: "Design review",
    password: PASSWORD,
  };

  it("gives an issue a name and a program manager's signature, and makes no issue", async () => {
    const { lusia } = await cast();
    const { contentHash } = await establish(lusia, "TF-2", "2026-05-01T08:00:00.000Z");
    await makeBaseline(lusia, asked, CLOCK);
    const issues = await issuesOf(lusia, "TF-2");
    expect(issues).toMatchObject([
      { number: 1, baselines: [{ name: "Preliminary design", purpose: "Design review", signedBy: "Lusia Brand" }] },
    ]);
    const { canonicalText } = await Signature.findOne({ where: { subjectType: "baseline" }, rejectOnEmpty: true });
    expect(canonicalText).toContain(`content: ${contentHash}\nname: Preliminary design`);
    expect((await verifyChain("TF-2")).faults).toEqual([]);
  });

  it("is refused to others, with a wrong password, for no issue, and under a name that is taken", async () => {
    const { lusia, tansy } = await cast();
    await establish(lusia, "TF-2", "2026-05-01T08:00:00.000Z");
    await expect(makeBaseline(tansy, asked, CLOCK)).rejects.toMatchObject({ code: "forbidden" });
    const wrong = { ...asked, password: "not my password" };
    await expect(makeBaseline(lusia, wrong, CLOCK)).rejects.toMatchObject({ code: "wrong_password" });
    await expect(makeBaseline(lusia, { ...asked, issue: 2 }, CLOCK)).rejects.toMatchObject({ code: "not_found" });
    expect([await Baseline.count(), await Signature.count()]).toEqual([0, 0]);
    await makeBaseline(lusia, asked, CLOCK);
    await expect(makeBaseline(lusia, asked, CLOCK)).rejects.toMatchObject({ code: "duplicate" });
  });
});
