import { beforeEach, describe, expect, it } from "vitest";
import { mergeRepeats } from "@/lib/audit/merge-repeats";
import { performAct } from "@/lib/audit/perform-act";
import { historyChoices, historyPage } from "@/lib/audit/queries";
import { REFUSALS_A_MINUTE } from "@/lib/audit/record-refusal";
import { verifyChain } from "@/lib/audit/verify-chain";
import { HOUSE_CHAIN } from "@/lib/vocabulary/acts";
import { RECORDED_REFUSALS, Refusal, type RefusalCode } from "@/lib/vocabulary/refusal";
import { HistoryEntry } from "@/models/history-entry";
import { User } from "@/models/user";
import { withDatabase } from "@/tests/support/database";
import { twoPersons, type Persons } from "@/tests/support/recorded-product";

withDatabase();

let persons: Persons;
let now = new Date("2026-12-01T09:00:00.000Z");
const clock = () => now;
const subject = { type: "account", id: "1", label: "Eva" };
const frame = { act: "end_sessions", chain: HOUSE_CHAIN, subject } as const;

beforeEach(async () => {
  now = new Date("2026-12-01T09:00:00.000Z");
  persons = await twoPersons();
});

function raiseEpoch(problem?: Error, records = 1): Promise<string> {
  return performAct(persons.eva, clock, frame, async (tx, record, at) => {
    await User.increment("sessionEpoch", { where: { id: persons.eva.userId }, transaction: tx });
    for (let count = 0; count < records; count += 1) {
      record({ act: "end_sessions", subject, was: { epoch: 0 }, now: { epoch: 1 }, reason: "Lost laptop." });
    }
    if (problem) throw problem;
    return at;
  });
}

function refused(code: RefusalCode, sentence = "No."): Promise<unknown> {
  return raiseEpoch(new Refusal(code, sentence)).catch((problem: unknown) => problem);
}

async function epoch(): Promise<number> {
  return (await User.findByPk(persons.eva.userId, { rejectOnEmpty: true })).sessionEpoch;
}

it("writes the change and its entry together, and hands back what the work answered", async () => {
  expect(await raiseEpoch()).toBe("2026-12-01T09:00:00.000Z");

  expect(await epoch()).toBe(1);
  const { rows } = await historyPage({ chain: HOUSE_CHAIN });
  expect(rows).toMatchObject([
    {
      ...{ sequence: 1, at: "2026-12-01T09:00:00.000Z", personId: persons.eva.userId, printedName: "Eva" },
      ...{ act: "end_sessions", was: { epoch: 0 }, now: { epoch: 1 }, reason: "Lost laptop.", outcome: "done" },
    },
  ]);
});

it("leaves neither change nor entry when the work breaks", async () => {
  await expect(raiseEpoch(new Error("broken on purpose"))).rejects.toThrow("broken on purpose");

  expect(await epoch()).toBe(0);
  expect(await HistoryEntry.count()).toBe(0);
});

it("takes no change that nothing was recorded of", async () => {
  await expect(raiseEpoch(undefined, 0)).rejects.toThrow("recorded nothing");
  expect(await epoch()).toBe(0);
});

it("lets work that changed nothing record nothing: a form sent twice", async () => {
  expect(await performAct(persons.eva, clock, frame, () => Promise.resolve("as before"))).toBe("as before");
  expect(await HistoryEntry.count()).toBe(0);
});

describe("a refused act", () => {
  it.each(RECORDED_REFUSALS)("(%s) changes nothing, is thrown on and stands in the history", async (code) => {
    expect(await refused(code, "Not you.")).toMatchObject({ code, message: "Not you." });

    expect(await epoch()).toBe(0);
    const { rows } = await historyPage({ outcome: "refused" });
    expect(rows).toMatchObject([
      {
        act: "end_sessions",
        personId: persons.eva.userId,
        reason: "Not you.",
        now: { refusal: code },
        subjectLabel: "Eva",
      },
    ]);
    expect((await verifyChain(HOUSE_CHAIN)).faults).toEqual([]);
  });

  it.each(["invalid", "not_found", "duplicate"] as const)(
    "for a fault of typing (%s) is not recorded",
    async (code) => {
      expect(await refused(code)).toMatchObject({ code });
      expect(await HistoryEntry.count()).toBe(0);
    },
  );

  it("in a chain that does not exist stands in the house's", async () => {
    const nowhere = { act: "create_product", chain: "NEW-1" } as const;
    const act = performAct(persons.eva, clock, nowhere, () => Promise.reject(new Refusal("forbidden", "No.")));
    await expect(act).rejects.toThrow("No.");
    expect((await historyPage({ chain: HOUSE_CHAIN })).total).toBe(1);
  });

  it("is written thirty times a minute and person; the rest is counted in the next entry", async () => {
    for (let attempt = 0; attempt < REFUSALS_A_MINUTE + 7; attempt += 1) await refused("forbidden");
    expect(await HistoryEntry.count()).toBe(REFUSALS_A_MINUTE);

    now = new Date(now.getTime() + 61_000);
    await refused("forbidden");
    await refused("forbidden");

    const { rows } = await historyPage({ chain: HOUSE_CHAIN }, 1, 2);
    expect(rows.map((row) => row.now)).toEqual([{ refusal: "forbidden" }, { refusal: "forbidden", leftOutBefore: 7 }]);
    expect((await verifyChain(HOUSE_CHAIN)).faults).toEqual([]);
  });
});

it("pages and filters the history, newest first", async () => {
  for (let count = 0; count < 5; count += 1) {
    await raiseEpoch();
    now = new Date(now.getTime() + 60_000);
  }
  await refused("forbidden");

  const page = await historyPage({ chain: HOUSE_CHAIN }, 2, 4);
  expect(page).toMatchObject({ total: 6, page: 2, pages: 2 });
  expect(page.rows.map(({ sequence }) => sequence)).toEqual([2, 1]);
  const between = { from: "2026-12-01T09:01:00.000Z", until: "2026-12-01T09:03:00.000Z" };
  expect((await historyPage(between)).rows.map(({ sequence }) => sequence)).toEqual([3, 2]);
  expect((await historyPage({ outcome: "refused" })).total).toBe(1);
  expect((await historyPage({ personId: persons.tom.userId })).total).toBe(0);
  expect(await historyChoices(HOUSE_CHAIN)).toEqual({
    persons: [{ id: persons.eva.userId, name: "Eva" }],
    acts: ["end_sessions"],
  });
});

it("shows refusals that repeat as one row, and acts that repeat each by itself", async () => {
  await raiseEpoch();
  await raiseEpoch();
  for (let count = 0; count < 3; count += 1) await refused("forbidden");
  await refused("forbidden", "Another sentence.");

  const { rows } = await historyPage({ chain: HOUSE_CHAIN });

  expect(mergeRepeats(rows).map(({ times, outcome }) => [outcome, times])).toEqual([
    ["refused", 1],
    ["refused", 3],
    ["done", 1],
    ["done", 1],
  ]);
});
