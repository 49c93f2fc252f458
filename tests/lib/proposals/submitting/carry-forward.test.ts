import { describe, expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { verifyChain } from "@/lib/audit/verify-chain";
import { carryForward } from "@/lib/proposals/submitting/carry-forward";
import { settlementView } from "@/lib/proposals/queries";
import { OutboxMessage } from "@/models/outbox-message";
import { Proposal } from "@/models/proposal";
import { newestBudget } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { adding, approvedItems, approves, CODE, formKey, proposed, reviewOf, revising, team } from "../review-cycle";

withDatabase();

/** Tansy's proposal on item 010, overtaken by one of Fenno's on the same item. */
async function overtaken(yours: object, theirs: object) {
  const people = await team();
  const { tansy, fenno, elske, clock } = people;
  await approvedItems(people, [adding("010", tansy.userId, 0.5, { name: "Mirror", order: 10 })]);
  const mine = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.5, yours)] });
  const other = await proposed(fenno, clock, { edits: [revising("010", "–", tansy.userId, 0.5, theirs)] });
  await approves(elske, other, "reviewer", clock);
  const { lockVersion } = await Proposal.findByPk(mine, { rejectOnEmpty: true });
  const input = { proposalId: mine, lockVersion, ontoIssue: 3, settled: [], key: formKey() };
  return { ...people, mine, input };
}

const itemBody = async () => {
  const { state } = await newestBudget(CODE);
  return state.lines.find(({ kind, number }) => kind === "item" && number === "010");
};

describe("carrying a proposal forward", () => {
  it("lets fields carry that one side changed: one confirmation makes the next round on the newest issue", async () => {
    const { tansy, ines, mine, input, clock } = await overtaken({ dragCoefficient: 0.49 }, { name: "Side mirror" });
    const view = await settlementView(tansy, CODE, "2");
    expect(view).toMatchObject({ baseIssue: 2, ontoIssue: 3, conflicts: [], obstacles: [] });
    expect(view.carried.map(({ field, side }) => [field, side])).toEqual(
      expect.arrayContaining([
        ["name", "theirs"],
        ["dragCoefficient", "yours"],
      ]),
    );

    expect(await carryForward(tansy, input, clock)).toMatchObject({ round: 2 });
    expect(await approves(ines, mine, "reviewer", clock)).toEqual({ state: "approved", issue: 4 });
    expect(await itemBody()).toMatchObject({ letter: "B", body: { name: "Side mirror", dragCoefficient: 0.49 } });
    expect(await verifyChain(CODE)).toMatchObject({ faults: [] });
  });

  it("asks for a settlement where both changed one field, and keeps the choice with its reason", async () => {
    const { tansy, input, mine, clock } = await overtaken({ dragCoefficient: 0.49 }, { dragCoefficient: 0.48 });
    const { conflicts } = await settlementView(tansy, CODE, "2");
    expect(conflicts).toMatchObject([
      { kind: "item", number: "010", field: "dragCoefficient", base: "0.5", theirs: "0.48", yours: "0.49" },
    ]);
    await expect(carryForward(tansy, input, clock)).rejects.toMatchObject({
      code: "invalid",
      faults: [{ path: "settled.item.010.dragCoefficient" }],
    });
    expect(await Proposal.findByPk(mine)).toMatchObject({ round: 1, baseIssue: 2 });

    const choice = { kind: "item" as const, number: "010", field: "dragCoefficient", choice: "yours" as const };
    const settled = [{ ...choice, why: "Measured after theirs." }];
    await carryForward(tansy, { ...input, settled }, clock);
    expect((await reviewOf(mine, clock)).round).toMatchObject({
      number: 2,
      baseIssue: 3,
      edits: [{ baseLetter: "A", body: { dragCoefficient: 0.49 } }],
    });
    const entries = (await historyPage({ chain: CODE, act: "carry_forward" })).rows;
    expect(entries).toMatchObject([
      {
        outcome: "done",
        reason: "010 dragCoefficient: yours. Measured after theirs.",
        now: { round: 2, baseIssue: 3 },
      },
    ]);
  });

  it("refuses a settlement table that is no longer the newest", async () => {
    const { tansy, input, clock } = await overtaken({ dragCoefficient: 0.49 }, { name: "Side mirror" });
    await expect(carryForward(tansy, { ...input, ontoIssue: 2 }, clock)).rejects.toMatchObject({ code: "moved" });
    await expect(carryForward(tansy, { ...input, lockVersion: 0 }, clock)).rejects.toMatchObject({ code: "moved" });
  });

  it("is for the editors alone", async () => {
    const { odo, ines, input, clock } = await overtaken({ dragCoefficient: 0.49 }, { name: "Side mirror" });
    for (const actor of [odo, ines]) {
      await expect(carryForward(actor, input, clock)).rejects.toMatchObject({ code: "forbidden" });
    }
  });

  it("tells the signers of the earlier round what moved; their signature no longer counts", async () => {
    const people = await team();
    const { tansy, fenno, ines, elske, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)]);
    const edit = revising("010", "–", tansy.userId, 0.5, { dragCoefficient: 1, name: "Far larger" });
    const mine = await proposed(tansy, clock, { edits: [edit] });
    await approves(ines, mine, "reviewer", clock);
    const other = await proposed(fenno, clock, { edits: [revising("010", "–", tansy.userId, 0.5, { order: 20 })] });
    await approves(elske, other, "reviewer", clock);
    const { lockVersion } = await Proposal.findByPk(mine, { rejectOnEmpty: true });
    await carryForward(tansy, { proposalId: mine, lockVersion, ontoIssue: 3, settled: [], key: formKey() }, clock);

    const review = await reviewOf(mine, clock);
    expect(review.approvals).toEqual([]);
    expect(review.signatures).toMatchObject([{ round: 1, signerId: ines.userId }]);
    const [mail] = await OutboxMessage.findAll({ where: { template: "superseded" } });
    expect(mail).toMatchObject({ toUserId: ines.userId });
    expect(JSON.parse(mail?.data ?? "{}")).toMatchObject({ signedRound: 1, round: 2 });
    const again = await OutboxMessage.findAll({ where: { template: "proposed", toUserId: ines.userId } });
    expect(again.filter(({ key }) => key.startsWith(`proposal ${mine}, proposed in round 2`))).toEqual([]);
  });
});
