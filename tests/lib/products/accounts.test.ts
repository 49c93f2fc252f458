import { expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { deactivateAccount } from "@/lib/products/deactivate-account";
import { accountsFor } from "@/lib/products/queries";
import { reactivateAccount } from "@/lib/products/reactivate-account";
import { actorById } from "@/lib/users/queries";
import { withDatabase } from "@/tests/support/database";
import { person } from "@/tests/support/people";

withDatabase();

const CLOCK = () => new Date("2026-03-01T09:00:00.000Z");
const NOW = "2026-03-01T09:00:00.000Z";

it("closes an account for every later request, and opens it again with another epoch of sessions", async () => {
  const admin = await person("Anke Post", { isAdministrator: true });
  const tom = await person("Tom Veer");
  const before = await actorById(tom.userId, NOW);
  const asked = { userId: tom.userId, reason: "Left the team." };

  await deactivateAccount(admin, asked, CLOCK);
  expect(await actorById(tom.userId, NOW)).toBeNull();
  await reactivateAccount(admin, { ...asked, reason: "Came back." }, CLOCK);
  const after = await actorById(tom.userId, NOW);
  expect(after?.actor).toEqual(before?.actor);
  expect(after?.sessionEpoch).toBeGreaterThan(before?.sessionEpoch ?? Number.NaN);
  expect((await historyPage({ chain: "house" })).rows.map(({ act, reason }) => [act, reason])).toEqual([
    ["reactivate_account", "Came back."],
    ["deactivate_account", "Left the team."],
  ]);
});

it("keeps the last administrator, and obeys nobody but an administrator", async () => {
  const admin = await person("Anke Post", { isAdministrator: true });
  const tom = await person("Tom Veer");
  const itself = { userId: admin.userId, reason: "By mistake." };
  await expect(deactivateAccount(admin, itself, CLOCK)).rejects.toMatchObject({ code: "wrong_state" });
  await expect(deactivateAccount(tom, itself, CLOCK)).rejects.toMatchObject({ code: "forbidden" });
  await expect(reactivateAccount(tom, itself, CLOCK)).rejects.toMatchObject({ code: "forbidden" });
  await expect(accountsFor(tom)).rejects.toMatchObject({ code: "forbidden" });
  const accounts = await accountsFor(admin);
  expect(accounts.map(({ name, active }) => [name, active])).toEqual([
    ["Anke Post", true],
    ["Tom Veer", true],
  ]);
  expect(Object.keys(accounts[0] ?? {})).not.toContain("passwordHash");
});
