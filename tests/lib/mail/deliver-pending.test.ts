import { afterEach, beforeEach, describe, expect, it } from "vitest";
import { performAct } from "@/lib/audit/perform-act";
import { deliverPending, waitAfter } from "@/lib/mail/deliver-pending";
import { startDeliveryLoop } from "@/lib/mail/delivery-loop";
import { enqueueMail } from "@/lib/mail/enqueue";
import { outboxState } from "@/lib/mail/outbox-state";
import { smtpTransport, type OutgoingMail, type SendMail } from "@/lib/mail/transport";
import { inTransaction } from "@/models/database";
import { HistoryEntry } from "@/models/history-entry";
import { OutboxMessage } from "@/models/outbox-message";
import { User } from "@/models/user";
import { withDatabase } from "@/tests/support/database";
import { freePort, startMailCatcher, type MailCatcher } from "@/tests/support/mail-catcher";
import { twoPersons, type Persons } from "@/tests/support/recorded-product";

const baseUrl = "http://127.0.0.1:3000";
const facts = { productCode: "TF2", productName: "Tractor fairing", label: "TF2-CP-04", proposalNumber: 4 };

withDatabase();

let persons: Persons;
let now = new Date("2026-12-01T09:00:00.000Z");
const clock = () => now;

beforeEach(async () => {
  now = new Date("2026-12-01T09:00:00.000Z");
  persons = await twoPersons();
});

function later(milliseconds: number): void {
  now = new Date(now.getTime() + milliseconds);
}

function enqueue(key: string, toUserId = persons.tom.userId): Promise<boolean> {
  const mail = { key, toUserId, template: "returned", data: { ...facts, actorName: "Eva" } } as const;
  return inTransaction((tx) => enqueueMail(mail, tx, now.toISOString()));
}

function toServer(port: number): SendMail {
  return smtpTransport({ NODE_ENV: "test", LEEBOARD_MAIL_PORT: String(port) });
}

function answering(...answers: (Error | null)[]): { send: SendMail; sent: OutgoingMail[] } {
  const sent: OutgoingMail[] = [];
  return {
    sent,
    send: async (mail) => {
      const answer = answers.shift();
      if (answer) throw answer;
      sent.push(mail);
    },
  };
}

function smtpError(code: string, responseCode?: number): Error {
  return Object.assign(new Error(`${code} ${responseCode ?? ""}`), { code, responseCode });
}

describe("against a mail server", () => {
  let catcher: MailCatcher | null = null;

  afterEach(async () => {
    await catcher?.stop();
    catcher = null;
  });

  it("sends each mail once, to its person, with number and link", async () => {
    catcher = await startMailCatcher();
    await enqueue("returned:4:1");
    await enqueue("returned:5:1", persons.eva.userId);

    const first = await deliverPending({ send: toServer(catcher.smtpPort), clock, baseUrl });
    const second = await deliverPending({ send: toServer(catcher.smtpPort), clock, baseUrl });

    expect(first).toEqual({ sent: 2, postponed: 0, failed: 0 });
    expect(second).toEqual({ sent: 0, postponed: 0, failed: 0 });
    const mails = await catcher.mails();
    expect(mails.map(({ to }) => to[0]?.address).sort()).toEqual(["eva@example.org", "tom@example.org"]);
    expect(mails[0]?.subject).toBe("TF2-CP-04 is returned");
    expect(mails[0]?.text).toContain("http://127.0.0.1:3000/products/TF2/proposals/4");
  });

  it("loses nothing and doubles nothing while the server is down and then up again", async () => {
    const port = await freePort();
    for (let number = 1; number <= 5; number += 1) await enqueue(`returned:${number}`);

    const down = await deliverPending({ send: toServer(port), clock, baseUrl });
    expect(down).toEqual({ sent: 0, postponed: 5, failed: 0 });
    expect(await outboxState()).toMatchObject({ waiting: 5, failed: 0, oldestSince: "2026-12-01T09:00:00.000Z" });

    catcher = await startMailCatcher(port);
    later(waitAfter(1));
    const up = await deliverPending({ send: toServer(port), clock, baseUrl });
    later(3_600_000);
    const again = await deliverPending({ send: toServer(port), clock, baseUrl });

    expect(up.sent).toBe(5);
    expect(again.sent).toBe(0);
    const caught = (await catcher.mails()).map(({ headers }) => String(headers["message-id"]));
    const written = (await OutboxMessage.findAll()).map(({ messageId }) => messageId);
    expect(caught.sort()).toEqual(written.sort());
    expect(await outboxState()).toMatchObject({ waiting: 0, failed: 0 });
  });

  it("sends each mail once though two deliverers run side by side", async () => {
    catcher = await startMailCatcher();
    for (let number = 1; number <= 8; number += 1) await enqueue(`returned:${number}`);
    const delivery = { send: toServer(catcher.smtpPort), clock, baseUrl };

    const counts = await Promise.all([deliverPending(delivery), deliverPending(delivery)]);

    expect(counts.map(({ sent }) => sent).reduce((sum, sent) => sum + sent)).toBe(8);
    const caught = (await catcher.mails()).map(({ headers }) => headers["message-id"]);
    expect(caught).toHaveLength(8);
    expect(new Set(caught).size).toBe(8);
  });

  it("is sent by the loop that the server runs", async () => {
    catcher = await startMailCatcher();
    const loop = startDeliveryLoop({ send: toServer(catcher.smtpPort), clock, baseUrl, pauseMs: 10 });
    await enqueue("returned:4:1");
    await expect.poll(async () => (await OutboxMessage.findOne())?.sentAt, { timeout: 10_000 }).not.toBeNull();
    await loop.stop();

    expect(await catcher.mails()).toHaveLength(1);
  });
});

it("writes one mail only under one key", async () => {
  expect(await enqueue("returned:4:1")).toBe(true);
  expect(await enqueue("returned:4:1")).toBe(false);
  expect(await OutboxMessage.count()).toBe(1);
});

it("tries a busy server again under the same Message-ID, later each time", async () => {
  await enqueue("returned:4:1");
  const { send, sent } = answering(smtpError("EENVELOPE", 451), smtpError("ETIMEDOUT"));
  const ids: string[] = [];
  const noting: SendMail = (mail) => {
    ids.push(mail.messageId);
    return send(mail);
  };

  await deliverPending({ send: noting, clock, baseUrl });
  later(4_999);
  await deliverPending({ send: noting, clock, baseUrl });
  expect(ids).toHaveLength(1);
  later(1);
  await deliverPending({ send: noting, clock, baseUrl });
  later(9_999);
  await deliverPending({ send: noting, clock, baseUrl });
  expect(ids).toHaveLength(2);
  later(1);
  await deliverPending({ send: noting, clock, baseUrl });

  expect(sent).toHaveLength(1);
  expect(new Set(ids).size).toBe(1);
});

it.each([
  ["an address that the server refuses", smtpError("EENVELOPE", 550)],
  ["a text that the server refuses", smtpError("EMESSAGE", 554)],
])("gives up on %s and goes on with the next", async (_, answer) => {
  await enqueue("returned:4:1");
  await enqueue("returned:5:1", persons.eva.userId);
  const { send, sent } = answering(answer);

  expect(await deliverPending({ send, clock, baseUrl })).toEqual({ sent: 1, postponed: 0, failed: 1 });

  expect(sent).toHaveLength(1);
  expect(await outboxState()).toMatchObject({ waiting: 0, failed: 1, lastProblem: answer.message });
});

it("sends nothing to a closed account", async () => {
  await enqueue("returned:4:1");
  await inTransaction((tx) => User.update({ active: false }, { where: { id: persons.tom.userId }, transaction: tx }));
  const { send, sent } = answering();

  expect((await deliverPending({ send, clock, baseUrl })).failed).toBe(1);
  expect(sent).toEqual([]);
});

it("takes up again what a process that died had claimed, when its lease has run out", async () => {
  await enqueue("returned:4:1");
  const dying = new Promise<void>(() => undefined);
  void deliverPending({ send: () => dying, clock, baseUrl });
  await expect.poll(async () => (await OutboxMessage.findOne())?.leasedUntil).not.toBeNull();
  const { send, sent } = answering();

  later(119_999);
  await deliverPending({ send, clock, baseUrl });
  expect(sent).toEqual([]);
  later(1);
  await deliverPending({ send, clock, baseUrl });
  expect(sent).toHaveLength(1);
});

it("leaves no mail of an act that was rolled back, and ties the mail of one that was not to its entry", async () => {
  const act = (fails: boolean) =>
    performAct(persons.eva, clock, { act: "end_sessions", chain: "house" }, async (tx, record, at) => {
      const data = { ...facts, actorName: "Eva" };
      await enqueueMail({ key: `k${fails}`, toUserId: persons.tom.userId, template: "returned", data }, tx, at);
      record({ act: "end_sessions", subject: { type: "account", id: "1", label: "Eva" } });
      if (fails) throw new Error("broken on purpose");
    });

  await expect(act(true)).rejects.toThrow("broken on purpose");
  expect(await OutboxMessage.count()).toBe(0);
  await act(false);

  const entry = await HistoryEntry.findOne({ rejectOnEmpty: true });
  expect((await OutboxMessage.findAll()).map(({ entryId }) => entryId)).toEqual([entry.id]);
});
