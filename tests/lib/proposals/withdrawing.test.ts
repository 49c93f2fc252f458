import { describe, expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { verifyChain } from "@/lib/audit/verify-chain";
import { raiseObjection } from "@/lib/proposals/signing/raise-objection";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { withdrawProposal } from "@/lib/proposals/submitting/withdraw-proposal";
import { OutboxMessage } from "@/models/outbox-message";
import { Proposal } from "@/models/proposal";
import { newestBudget } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { adding, approves, CODE, formKey, proposed, team } from "./review-cycle";

withDatabase();

const REASON = "The part is made elsewhere now.";

describe("withdrawing", () => {
  it("is for the proposer and a program manager; those who were asked to sign are told", async () => {
    const { tansy, odo, ines, elske, lusia, fenno, clock } = await team();
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    for (const actor of [odo, ines]) {
      await expect(withdrawProposal(actor, { proposalId, reason: REASON }, clock)).rejects.toMatchObject({
        code: "forbidden",
      });
    }
    await withdrawProposal(lusia, { proposalId, reason: REASON }, clock);
    expect(await Proposal.findByPk(proposalId)).toMatchObject({ state: "withdrawn", number: 1 });
    const told = await OutboxMessage.findAll({ where: { template: "withdrawn" } });
    expect(told.map(({ toUserId }) => toUserId).sort((a, b) => a - b)).toEqual(
      [tansy, ines, elske, fenno].map(({ userId }) => userId).sort((a, b) => a - b),
    );
    expect((await historyPage({ chain: CODE, act: "withdraw_proposal" })).rows[0]).toMatchObject({
      outcome: "done",
      reason: REASON,
      was: { state: "proposed" },
      now: { state: "withdrawn" },
    });
  });

  it("of a draft is for its proposer alone, tells nobody and gives no number", async () => {
    const { tansy, lusia, clock } = await team();
    const { proposalId } = await startDraft(tansy, { productCode: CODE, title: "Secret", key: formKey() }, clock);
    await expect(withdrawProposal(lusia, { proposalId, reason: REASON }, clock)).rejects.toMatchObject({
      code: "forbidden",
    });
    await withdrawProposal(tansy, { proposalId, reason: REASON }, clock);
    expect(await Proposal.findByPk(proposalId)).toMatchObject({ state: "withdrawn", number: null });
    expect(await OutboxMessage.count()).toBe(0);
    expect(JSON.stringify((await historyPage({ chain: CODE })).rows)).not.toContain("Secret");
    expect(await verifyChain(CODE)).toMatchObject({ faults: [] });
  });
});

describe("an objection", () => {
  it("moves nothing: the signatures that are asked for still make the issue", async () => {
    const { tansy, odo, maud, ines, lusia, clock } = await team();
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    const no = { proposalId, reason: "It spoils the flow over my item.", key: formKey() };
    await expect(raiseObjection(maud, no, clock)).rejects.toMatchObject({ code: "forbidden" });
    const raised = await raiseObjection(odo, no, clock);
    expect(await raiseObjection(odo, no, clock)).toEqual(raised);
    await approves(ines, proposalId, "reviewer", clock);
    expect(await approves(lusia, proposalId, "program_manager", clock)).toEqual({ state: "approved", issue: 2 });
    expect((await newestBudget(CODE)).issue).toBe(2);
    await expect(raiseObjection(odo, { ...no, key: formKey() }, clock)).rejects.toMatchObject({ code: "wrong_state" });
  });
});
