import { beforeEach, describe, expect, it } from "vitest";
import { authOptions, authorizeCredentials, livingToken } from "@/app/_server/auth-options";
import { historyPage } from "@/lib/audit/queries";
import { ATTEMPTS_BY_EMAIL } from "@/lib/users/attempts";
import { hashPassword } from "@/lib/users/password";
import type { Actor } from "@/lib/vocabulary/actor";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import { inTransaction } from "@/models/database";
import { User } from "@/models/user";
import { withDatabase } from "@/tests/support/database";
import { person } from "@/tests/support/people";

withDatabase();

const PASSWORD = "correct horse battery";
const CHEAP = { logN: 4, r: 8, p: 1 };
const ADDRESS = "127.0.0.1";
let count = 0;
let ines: Actor;
let email = "";

beforeEach(async () => {
  // Attempts are counted per process: each test has an account of its own.
  count += 1;
  const name = `Ines ${"q".repeat(count)}`;
  ines = await person(name, { passwordHash: await hashPassword(PASSWORD, CHEAP) });
  email = `ines.${"q".repeat(count)}@example.org`;
});

async function close(userId: number): Promise<void> {
  await inTransaction((tx) => User.update({ active: false }, { where: { id: userId }, transaction: tx }));
}

describe("a sign-in", () => {
  it("answers with the account's id and epoch and nothing else of its row", async () => {
    const user = await authorizeCredentials({ email: `  ${email.toUpperCase()} `, password: PASSWORD }, ADDRESS);

    expect(user).toEqual({ id: String(ines.userId), epoch: 0 });
  });

  it("answers the same for a wrong password, an unknown address and a closed account", async () => {
    expect(await authorizeCredentials({ email, password: "something else" }, ADDRESS)).toBeNull();
    expect(await authorizeCredentials({ email: "nobody@example.org", password: PASSWORD }, ADDRESS)).toBeNull();
    await close(ines.userId);
    expect(await authorizeCredentials({ email, password: PASSWORD }, ADDRESS)).toBeNull();
  });

  it("takes a form without fields, or with something else in them, for a wrong one", async () => {
    expect(await authorizeCredentials(undefined, ADDRESS)).toBeNull();
    expect(await authorizeCredentials({ email: ["a"], password: { length: 3 } }, ADDRESS)).toBeNull();
  });

  it("refuses with a code, though the password is right, once the attempts have run out", async () => {
    for (let attempt = 0; attempt < ATTEMPTS_BY_EMAIL; attempt += 1) {
      await authorizeCredentials({ email, password: "something else" }, ADDRESS);
    }

    await expect(authorizeCredentials({ email, password: PASSWORD }, ADDRESS)).rejects.toThrow("too_many_attempts");
  });

  it("stands in the history of the house", async () => {
    await authorizeCredentials({ email, password: PASSWORD }, ADDRESS);

    const { rows } = await historyPage({ chain: HOUSE_CHAIN });
    expect(rows).toMatchObject([{ act: "sign_in", outcome: "done", printedName: ines.printedName }]);
  });
});

describe("the token of a session", () => {
  it("lives while its account is open and its epoch is the account's", async () => {
    expect(await livingToken({ userId: ines.userId, epoch: 0 })).toEqual({ userId: ines.userId, epoch: 0 });
    expect(await livingToken({ userId: ines.userId, epoch: 1 })).toEqual({});
    await close(ines.userId);
    expect(await livingToken({ userId: ines.userId, epoch: 0 })).toEqual({});
  });

  it("is worth nothing after a sign-out, even where the cookie was copied", async () => {
    const copied = { userId: ines.userId, epoch: 0 };

    await authOptions.events?.signOut?.({ token: { ...copied }, session: { ...copied, expires: "" } });

    expect(await livingToken(copied)).toEqual({});
  });

  it("ends nobody's sessions when a dead token signs out again", async () => {
    const copied = { userId: ines.userId, epoch: 0 };
    const session = { ...copied, expires: "" };
    await authOptions.events?.signOut?.({ token: { ...copied }, session });

    await authOptions.events?.signOut?.({ token: { ...copied }, session });

    expect((await User.findByPk(ines.userId))?.sessionEpoch).toBe(1);
  });

  it("is kept in a cookie that no script reads", () => {
    expect(authOptions.cookies?.sessionToken?.options).toMatchObject({ httpOnly: true, sameSite: "lax", path: "/" });
  });
});
