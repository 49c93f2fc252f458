import { QueryTypes } from "sequelize";
import { expect, it } from "vitest";
import { database, inSnapshot, inTransaction } from "@/models/database";
import { migrateDatabase } from "@/models/migrations/migrate";
import { User } from "@/models/user";
import { withDatabase } from "../support/database";

const AT = "2026-12-01T08:00:00.000Z";

withDatabase();

function person(email: string) {
  return { email, name: "Eva Test", passwordHash: "x", createdAt: AT };
}

async function connectionPragma(name: string, tx: NonNullable<Parameters<typeof User.count>[0]>["transaction"]) {
  const [row] = await database.query(`PRAGMA ${name}`, { type: QueryTypes.SELECT, transaction: tx });
  return Object.values(row ?? {})[0];
}

it("runs a migration once only", async () => {
  expect(await migrateDatabase()).toEqual([]);
});

it("keeps a committed row and reads booleans as booleans", async () => {
  await inTransaction((tx) => User.create(person("eva@example.org"), { transaction: tx }));

  const eva = await User.findOne({ where: { email: "eva@example.org" } });

  expect(eva?.active).toBe(true);
  expect(eva?.isAdministrator).toBe(false);
  expect(await User.count({ where: { active: true } })).toBe(1);
});

it("leaves nothing of a transaction that throws, and goes on with the next", async () => {
  const broken = inTransaction(async (tx) => {
    await User.create(person("eva@example.org"), { transaction: tx });
    throw new Error("broken on purpose");
  });
  const next = inTransaction((tx) => User.create(person("tom@example.org"), { transaction: tx }));

  await expect(broken).rejects.toThrow("broken on purpose");
  await next;

  expect((await User.findAll()).map(({ email }) => email)).toEqual(["tom@example.org"]);
});

it("lets a hundred writers at once each have their turn", async () => {
  await inTransaction((tx) => User.create(person("eva@example.org"), { transaction: tx }));

  await Promise.all(
    Array.from({ length: 100 }, () =>
      inTransaction(async (tx) => {
        const eva = await User.findOne({ where: { email: "eva@example.org" }, transaction: tx, rejectOnEmpty: true });
        await eva.update({ sessionEpoch: eva.sessionEpoch + 1 }, { transaction: tx });
      }),
    ),
  );

  expect((await User.findOne({ rejectOnEmpty: true })).sessionEpoch).toBe(100);
});

it("refuses a write without a transaction", async () => {
  await expect(User.create(person("eva@example.org"))).rejects.toThrow("A write needs a transaction");
  await expect(database.query("UPDATE users SET name = 'x'")).rejects.toThrow("A write needs a transaction");
  expect(await User.count()).toBe(0);
});

it("refuses a transaction inside a transaction instead of waiting for ever", async () => {
  await expect(inTransaction(() => inTransaction(() => Promise.resolve()))).rejects.toThrow("would wait for itself");
});

it("refuses a write in a snapshot, and a snapshot does not see what was committed after it began", async () => {
  await inSnapshot(async (tx) => {
    expect(await User.count({ transaction: tx })).toBe(0);
    await inTransaction((write) => User.create(person("eva@example.org"), { transaction: write }));
    expect(await User.count({ transaction: tx })).toBe(0);
    await expect(User.create(person("tom@example.org"), { transaction: tx })).rejects.toThrow();
  });
  expect(await User.count()).toBe(1);
});

it("holds every connection to foreign keys and recursive triggers", async () => {
  await inTransaction(async (tx) => {
    expect(await connectionPragma("foreign_keys", tx)).toBe(1);
    expect(await connectionPragma("recursive_triggers", tx)).toBe(1);
    expect(await connectionPragma("busy_timeout", tx)).toBe(5000);
  });
  expect(await connectionPragma("journal_mode", null)).toBe("wal");
});

it("frees the lock when the commit itself fails", async () => {
  const broken = inTransaction(async (tx) => {
    await database.query("PRAGMA defer_foreign_keys = ON", { transaction: tx });
    await database.query(`INSERT INTO sessions VALUES ('s', 99, '${AT}', NULL)`, { transaction: tx });
  });
  await expect(broken).rejects.toThrow("FOREIGN KEY");

  await inTransaction((tx) => User.create(person("eva@example.org"), { transaction: tx }));

  expect(await User.count()).toBe(1);
});
