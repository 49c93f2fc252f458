import { describe, expect, it } from "vitest";
import { allocationsOf } from "@/lib/evaluation/budget/indexed-state";
import { propose } from "@/lib/proposals/submitting/propose";
import { proposalView } from "@/lib/proposals/queries";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { Round } from "@/models/round";
import { newestBudget } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { adding, approvedItems, approves, CODE, content, formKey, PASSWORD, proposed, team } from "./review-cycle";

withDatabase();

const unallocated = { kind: "unallocated" as const, number: null };
const item = (number: string) => ({ kind: "item" as const, number });

async function withItems() {
  const people = await team();
  const { tansy, odo, fenno } = people;
  await approvedItems(people, [adding("010", tansy.userId, 0.5), adding("020", odo.userId, 0.3)], fenno);
  return people;
}

/** Limit 100 N, reserve 10 N: recounted from the stored sheet, without the product's arithmetic. */
async function sheet() {
  const { rows, unallocatedHundredths } = allocationsOf((await newestBudget(CODE)).state);
  const allocated = rows.reduce((sum, { hundredths }) => sum + hundredths, 0);
  expect(allocated + unallocatedHundredths + 1000).toBe(10000);
  return Object.fromEntries(rows.map(({ number, hundredths }) => [number, hundredths]));
}

describe("transfers of allocation", () => {
  it("are signed by the program manager who submits them with a password; the independent reviewer stays", async () => {
    const { lusia, ines, fenno, clock } = await withItems();
    const transfers = [{ giver: unallocated, receiver: item("010"), hundredths: 2500 }];
    const proposalId = await proposed(lusia, clock, { transfers }, PASSWORD);
    expect(await Round.findOne({ where: { proposalId } })).toMatchObject({ submittedAs: "program_manager" });

    const view = await proposalView(fenno, CODE, "2", undefined, clock);
    expect(view?.routing?.capacities).toMatchObject([
      { capacity: "reviewer", filledBy: null },
      { capacity: "program_manager", filledBy: { printedName: "Lusia Manager", meaning: "Signed by submitting it" } },
    ]);
    expect(await approves(ines, proposalId, "reviewer", clock)).toEqual({ state: "approved", issue: 3 });
    expect(await sheet()).toEqual({ "010": 2500 });
  });

  it("are refused without that password, at its field, and with a wrong one", async () => {
    const { lusia, clock } = await withItems();
    const { proposalId } = await startDraft(lusia, { productCode: CODE, title: "", key: formKey() }, clock);
    const transfers = [{ giver: unallocated, receiver: item("010"), hundredths: 2500 }];
    await saveDraft(lusia, { proposalId, lockVersion: 0, content: content({ transfers }) }, clock);
    const input = { proposalId, lockVersion: 1, key: formKey() };
    await expect(propose(lusia, { ...input, password: null }, clock)).rejects.toMatchObject({
      code: "invalid",
      faults: [{ path: "password" }],
    });
    await expect(propose(lusia, { ...input, password: "no" }, clock)).rejects.toMatchObject({ code: "wrong_password" });
    expect(await Round.count({ where: { proposalId } })).toBe(0);
  });

  it("may be asked by an owner to and from their own items, and then need another's signature as manager", async () => {
    const { tansy, odo, ines, lusia, clock } = await withItems();
    const foreign = { giver: unallocated, receiver: item("020"), hundredths: 100 };
    await expect(proposed(tansy, clock, { transfers: [foreign] })).rejects.toMatchObject({ code: "forbidden" });
    const proposalId = await proposed(odo, clock, { transfers: [foreign] });
    expect(await approves(ines, proposalId, "reviewer", clock)).toEqual({ state: "proposed", issue: null });
    expect(await approves(lusia, proposalId, "program_manager", clock)).toEqual({ state: "approved", issue: 3 });
    expect(await sheet()).toEqual({ "020": 100 });
  });

  it("do not overtake each other, but a giver who no longer holds enough blocks the last signature by name", async () => {
    const { lusia, fenno, ines, elske, clock } = await withItems();
    const from = (hundredths: number, receiver: string) => [
      { giver: unallocated, receiver: item(receiver), hundredths },
    ];
    const first = await proposed(lusia, clock, { transfers: from(5000, "010") }, PASSWORD);
    const second = await proposed(fenno, clock, { transfers: from(3000, "020") }, PASSWORD);
    const third = await proposed(fenno, clock, { transfers: from(2000, "020") }, PASSWORD);
    await approves(ines, first, "reviewer", clock);
    expect(await approves(ines, second, "reviewer", clock)).toMatchObject({ state: "approved" });
    await expect(approves(elske, third, "reviewer", clock)).rejects.toMatchObject({
      code: "conservation",
      message: expect.stringMatching(/10\.00/),
    });
    expect((await proposalView(ines, CODE, "4", undefined, clock))?.blocked).toMatch(/10\.00/);
    expect(await sheet()).toEqual({ "010": 5000, "020": 3000 });
  });
});
