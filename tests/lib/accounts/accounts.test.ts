import { beforeEach, describe, expect, it } from "vitest";
import { changePassword } from "@/lib/accounts/change-password";
import { ChangePasswordInput, SignInInput } from "@/lib/accounts/schema";
import { signIn } from "@/lib/accounts/sign-in";
import { endSessions, signOut } from "@/lib/accounts/sign-out";
import { performAct } from "@/lib/audit/perform-act";
import { historyPage } from "@/lib/audit/queries";
import { verifyChain } from "@/lib/audit/verify-chain";
import { ATTEMPTS_BY_EMAIL, ATTEMPTS_BY_PERSON } from "@/lib/users/attempts";
import { createUser } from "@/lib/users/create-user";
import { deactivateUser } from "@/lib/users/deactivate-user";
import { demandPassword } from "@/lib/users/demand-password";
import { hashPassword } from "@/lib/users/password";
import { actorById, listAccounts, userByEmail } from "@/lib/users/queries";
import { reactivateUser } from "@/lib/users/reactivate-user";
import type { Actor } from "@/lib/vocabulary/actor";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import { Membership } from "@/models/membership";
import { inTransaction } from "@/models/database";
import { Product } from "@/models/product";
import { User } from "@/models/user";
import { withDatabase } from "@/tests/support/database";

withDatabase();

const AT = "2026-12-01T09:00:00.000Z";
const clock = () => new Date(AT);
const PASSWORD = "correct horse battery";
const CHEAP = { logN: 4, r: 8, p: 1 };
const LEEBOARD = { userId: null, printedName: "Leeboard" };
let count = 0;
let email = "";
let eva: Actor;

beforeEach(async () => {
  // Attempts are counted per process: each test has an address of its own.
  count += 1;
  email = `eva${count}@example.org`;
  eva = await account(email, "Eva");
});

async function account(address: string, name: string, isAdministrator = false): Promise<Actor> {
  const passwordHash = await hashPassword(PASSWORD, CHEAP);
  const frame = { act: "create_account", chain: HOUSE_CHAIN } as const;
  const userId = await performAct(LEEBOARD, clock, frame, (tx, record, at) =>
    createUser({ email: address, name, passwordHash, isAdministrator }, { tx, record, at }),
  );
  // A forgotten count of another test's person with the same id must not stand in the way.
  await demandPassword(userId, PASSWORD).catch(() => undefined);
  return { userId, printedName: name, isAdministrator, memberships: [] };
}

function from(address = `10.0.0.${count}`, password = PASSWORD, as = email) {
  return signIn({ email: as, password }, address, clock);
}

async function houseHistory() {
  const { rows } = await historyPage({ chain: HOUSE_CHAIN });
  return rows.map(({ act, outcome, printedName }) => `${printedName}: ${act} ${outcome}`).reverse();
}

describe("signing in", () => {
  it("answers who it is and stands in the house's history", async () => {
    expect(await from()).toEqual({ userId: eva.userId, printedName: "Eva", sessionEpoch: 0 });
    expect(await houseHistory()).toEqual(["Leeboard: create_account done", "Eva: sign_in done"]);
    expect((await verifyChain(HOUSE_CHAIN)).faults).toEqual([]);
  });

  it("refuses a wrong password, an address of nobody and a closed account in the same words", async () => {
    const sentence = "E-mail address or password is wrong.";
    await expect(from(undefined, "wrong")).rejects.toThrow(sentence);
    await expect(from(undefined, PASSWORD, `nobody${count}@example.org`)).rejects.toThrow(sentence);
    await inTransaction((tx) => User.update({ active: false }, { where: { id: eva.userId }, transaction: tx }));
    await expect(from()).rejects.toThrow(sentence);

    expect((await houseHistory()).slice(1)).toEqual([
      "Eva: sign_in refused",
      "Nobody known: sign_in refused",
      "Eva: sign_in refused",
    ]);
  });

  it("writes down nothing of what was typed as the address of nobody, nor any password", async () => {
    await from(undefined, "secret-word-1", `typed-secret${count}@example.org`).catch(() => undefined);
    const { rows } = await historyPage({ chain: HOUSE_CHAIN });
    expect(JSON.stringify(rows)).not.toMatch(/secret|correct horse/);
  });

  it("takes about as long for an address of nobody as for a wrong password", async () => {
    const real = await account(`slow${count}@example.org`, "Slow");
    const passwordHash = await hashPassword(PASSWORD);
    await inTransaction((tx) => User.update({ passwordHash }, { where: { id: real.userId }, transaction: tx }));
    const took = async (address: string) => {
      const start = performance.now();
      await from(undefined, "wrong", address).catch(() => undefined);
      return performance.now() - start;
    };
    // The shortest of three, so that a busy machine does not count.
    const known: number[] = [];
    const unknown: number[] = [];
    for (let turn = 0; turn < 3; turn += 1) {
      known.push(await took(`slow${count}@example.org`));
      unknown.push(await took(`none${count}@example.org`));
    }
    const ratio = Math.min(...unknown) / Math.min(...known);
    expect(ratio).toBeGreaterThan(1 / 3);
    expect(ratio).toBeLessThan(3);
  });

  it("refuses an account after too many attempts, even with the right password, and no other account", async () => {
    for (let attempt = 0; attempt < ATTEMPTS_BY_EMAIL; attempt += 1) await from(undefined, "x").catch(() => undefined);
    await expect(from()).rejects.toMatchObject({ code: "too_many_attempts" });
    await account(`ida${count}@example.org`, "Ida");
    expect(await from("10.1.0.1", PASSWORD, `ida${count}@example.org`)).toMatchObject({ printedName: "Ida" });
  });

  it("gives the attempts back after one that succeeded", async () => {
    for (let turn = 0; turn < 3; turn += 1) {
      for (let attempt = 0; attempt < ATTEMPTS_BY_EMAIL - 1; attempt += 1) {
        await from("10.2.0.1", "x").catch(() => undefined);
      }
      expect(await from("10.2.0.1")).toMatchObject({ userId: eva.userId });
    }
  });

  it("normalises the address as it was typed", () => {
    const typed = { email: "  Eva@Example.ORG ", password: "x" };
    expect(SignInInput.parse(typed)).toEqual({ email: "eva@example.org", password: "x" });
    expect(SignInInput.safeParse({ email: "eva", password: "x" }).success).toBe(false);
  });
});

describe("sessions", () => {
  it.each([
    ["sign_out", signOut],
    ["end_sessions", endSessions],
  ] as const)("end with %s: the epoch under which they were made is over", async (act, end) => {
    await end(eva, clock);
    expect((await actorById(eva.userId, AT))?.sessionEpoch).toBe(1);
    expect((await houseHistory()).at(-1)).toBe(`Eva: ${act} done`);
  });

  it("end when the password is changed, and the new one is the password from then on", async () => {
    const next = "another good password";
    expect(await changePassword(eva, { current: PASSWORD, next, again: next }, clock)).toEqual({ sessionEpoch: 1 });

    await expect(from()).rejects.toMatchObject({ code: "wrong_password" });
    expect(await from(undefined, next)).toMatchObject({ sessionEpoch: 1 });
  });

  it("stay when the present password is wrong; the refusal is recorded at its field", async () => {
    const next = "another good password";
    await expect(changePassword(eva, { current: "x", next, again: next }, clock)).rejects.toMatchObject({
      code: "wrong_password",
      faults: [{ path: "current" }],
    });
    expect((await actorById(eva.userId, AT))?.sessionEpoch).toBe(0);
    expect((await houseHistory()).at(-1)).toBe("Eva: change_password refused");
    expect(await from()).toMatchObject({ userId: eva.userId });
  });

  it("end when the account is closed, which keeps its name; it can be opened again", async () => {
    const act = { act: "deactivate_account", chain: HOUSE_CHAIN } as const;
    await performAct(LEEBOARD, clock, act, (tx, record) =>
      deactivateUser({ userId: eva.userId, reason: "Left the team." }, { tx, record }),
    );
    expect(await actorById(eva.userId, AT)).toBeNull();
    expect(await userByEmail(email)).toMatchObject({ name: "Eva", active: false });

    await performAct(LEEBOARD, clock, { ...act, act: "reactivate_account" }, (tx, record) =>
      reactivateUser({ userId: eva.userId, reason: "Came back." }, { tx, record }),
    );
    expect((await actorById(eva.userId, AT))?.sessionEpoch).toBe(1);
  });
});

it("closes no account that is the last open administrator's", async () => {
  const boss = await account(`boss${count}@example.org`, "Boss", true);
  const close = performAct(boss, clock, { act: "deactivate_account", chain: HOUSE_CHAIN }, (tx, record) =>
    deactivateUser({ userId: boss.userId, reason: "Left." }, { tx, record }),
  );
  await expect(close).rejects.toMatchObject({ code: "wrong_state" });
});

it("makes no second account for an address, however it is typed", async () => {
  await expect(account(` ${email.toUpperCase()}`, "Other")).rejects.toMatchObject({
    code: "duplicate",
    faults: [{ path: "email" }],
  });
});

it("refuses a person who types too many wrong passwords before a signature", async () => {
  for (let attempt = 0; attempt < ATTEMPTS_BY_PERSON; attempt += 1) {
    await expect(demandPassword(eva.userId, "x")).rejects.toMatchObject({ code: "wrong_password" });
  }
  await expect(demandPassword(eva.userId, PASSWORD)).rejects.toMatchObject({ code: "too_many_attempts" });
});

it("knows the roles in force at a moment and no others", async () => {
  await inTransaction(async (tx) => {
    const facts = { code: "TF2", name: "Fairing", kind: "vehicle_fairing", timeZone: "UTC", createdAt: AT } as const;
    const product = await Product.create(facts, { transaction: tx });
    const role = { userId: eva.userId, productId: product.id };
    const dates = [
      { role: "reviewer", fromAt: "2026-01-01T00:00:00.000Z", untilAt: "2026-06-01T00:00:00.000Z" },
      { role: "auditor", fromAt: "2026-06-01T00:00:00.000Z" },
      { role: "program_manager", fromAt: "2027-01-01T00:00:00.000Z" },
    ] as const;
    for (const dated of dates) await Membership.create({ ...role, ...dated }, { transaction: tx });
  });
  const rolesAt = async (at: string) => (await actorById(eva.userId, at))?.actor.memberships.map(({ role }) => role);

  expect(await rolesAt("2026-05-31T23:59:59.999Z")).toEqual(["reviewer"]);
  expect(await rolesAt("2026-06-01T00:00:00.000Z")).toEqual(["auditor"]);
  expect(await rolesAt("2027-01-01T00:00:00.000Z")).toEqual(["auditor", "program_manager"]);
});

it("hands out no password hash", async () => {
  const answers = [await listAccounts(), await userByEmail(email), await actorById(eva.userId, AT), await from()];
  expect(JSON.stringify(answers)).not.toContain("scrypt");
});

it.each([
  [{ current: "x", next: "short", again: "short" }, "next"],
  [{ current: "x", next: "long enough password", again: "long enough passwort" }, "again"],
  [{ current: "long enough password", next: "long enough password", again: "long enough password" }, "next"],
])("refuses a new password at its field: %o", (input, path) => {
  expect(ChangePasswordInput.safeParse(input).error?.issues.map((issue) => issue.path.join("."))).toContain(path);
});
