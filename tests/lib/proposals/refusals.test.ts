import { describe, expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { addRemark } from "@/lib/proposals/remarks/add-remark";
import { propose } from "@/lib/proposals/submitting/propose";
import { returnProposal } from "@/lib/proposals/signing/return-proposal";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { settleRemark } from "@/lib/proposals/remarks/settle-remark";
import { signProposal } from "@/lib/proposals/signing/sign-proposal";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { takeBackApproval } from "@/lib/proposals/signing/take-back-approval";
import { withdrawProposal } from "@/lib/proposals/submitting/withdraw-proposal";
import { Issue } from "@/models/issue";
import { OutboxMessage } from "@/models/outbox-message";
import { Proposal } from "@/models/proposal";
import { Round } from "@/models/round";
import { Signature } from "@/models/signature";
import { withDatabase } from "@/tests/support/database";
import {
  adding,
  approval,
  approvedItems,
  approves,
  CODE,
  content,
  formKey,
  proposed,
  reviewOf,
  revising,
  team,
  type Team,
} from "./review-cycle";

withDatabase();

/** Everything that a refused act must leave as it was, and what it adds to the history. */
async function refusedAct(act: () => Promise<unknown>, code: string, name: string) {
  const before = await standing();
  await expect(act()).rejects.toMatchObject({ code });
  expect(await standing()).toEqual(before);
  const [entry] = (await historyPage({ chain: CODE })).rows;
  expect(entry).toMatchObject({ act: name, outcome: "refused", now: { refusal: code } });
}

async function standing() {
  const raw = { raw: true, order: [["id", "ASC"]] } as { raw: true; order: [["id", "ASC"]] };
  return {
    proposals: await Proposal.findAll(raw),
    signatures: await Signature.findAll(raw),
    issues: await Issue.findAll(raw),
    mails: await OutboxMessage.findAll(raw),
  };
}

async function withItem(): Promise<Team & { small: number }> {
  const people = await team();
  const { tansy, clock } = people;
  const edits = [adding("010", tansy.userId, 0.5), adding("020", people.odo.userId, 0.3)];
  await approvedItems(people, edits, people.fenno);
  const small = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.49)] });
  return { ...people, small };
}

describe("refused acts change nothing and stand in the history", () => {
  it("refuses a signature for want of the role, whatever else is wrong", async () => {
    const { odo, maud, lusia, small, clock } = await withItem();
    for (const actor of [odo, maud]) {
      await refusedAct(() => approves(actor, small, "reviewer", clock), "forbidden", "approve_proposal");
    }
    await refusedAct(() => approves(lusia, small, "reviewer", clock), "forbidden", "approve_proposal");
  });

  it("refuses one's own signature, also with a second role", async () => {
    const { tansy, small, clock } = await withItem();
    const { memberships } = tansy;
    const productId = memberships[0]?.productId ?? 0;
    const both = { ...tansy, memberships: [...memberships, { productId, role: "reviewer" as const }] };
    await refusedAct(() => approves(both, small, "reviewer", clock), "not_independent", "approve_proposal");
  });

  it("refuses the owner of an edited item, before and after the change", async () => {
    const people = await team();
    const { tansy, ines, fenno, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)]);
    const productId = tansy.memberships[0]?.productId ?? 0;
    const reviewing = { ...tansy, memberships: [...tansy.memberships, { productId, role: "reviewer" as const }] };
    const handed = await proposed(fenno, clock, { edits: [revising("010", "–", people.odo.userId, 0.49)] });
    await refusedAct(() => approves(reviewing, handed, "reviewer", clock), "not_independent", "approve_proposal");
    const { routing } = await reviewOf(handed, clock);
    expect(routing.flatMap(({ maySign }) => maySign.map(({ userId }) => userId))).not.toContain(fenno.userId);
    expect(routing[0]?.maySign.map(({ userId }) => userId)).toContain(ines.userId);
  });

  it("refuses a second signature in a capacity that is filled, and one person in two capacities", async () => {
    const people = await team();
    const { tansy, ines, elske, clock } = people;
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    await approves(ines, proposalId, "reviewer", clock);
    await refusedAct(() => approves(elske, proposalId, "reviewer", clock), "capacity_taken", "approve_proposal");
    await refusedAct(() => approves(ines, proposalId, "reviewer", clock), "capacity_taken", "approve_proposal");
  });

  it("refuses a wrong password, after the right to sign was asked and before anything is told of the sheet", async () => {
    const { ines, odo, small, clock } = await withItem();
    const wrong = { ...(await approval(small, "reviewer", clock)), password: "not it" };
    await refusedAct(() => signProposal(odo, wrong, clock), "forbidden", "approve_proposal");
    await refusedAct(() => signProposal(ines, wrong, clock), "wrong_password", "approve_proposal");
  });

  it("refuses what was decided, withdrawn or returned already", async () => {
    const { tansy, ines, elske, small, clock } = await withItem();
    const sheet = await approval(small, "reviewer", clock);
    const { round } = await reviewOf(small, clock);
    const input = { proposalId: small, roundHash: round.hash, capacity: "reviewer", deputyForId: null } as const;
    await returnProposal(ines, { ...input, reason: "State the source of C_D." }, clock);
    await refusedAct(() => signProposal(elske, sheet, clock), "wrong_state", "approve_proposal");
    await withdrawProposal(tansy, { proposalId: small, reason: "Not needed any more." }, clock);
    const again = () => withdrawProposal(tansy, { proposalId: small, reason: "Once more." }, clock);
    await refusedAct(again, "wrong_state", "withdraw_proposal");
    const late = () => propose(tansy, { proposalId: small, lockVersion: 4, key: formKey(), password: null }, clock);
    await refusedAct(late, "wrong_state", "propose");
  });

  it("takes no approval while a remark asks for action; settled by who raised it or an uninvolved manager only", async () => {
    const { tansy, odo, ines, elske, lusia, small, clock } = await withItem();
    const remark = {
      ...{
        proposalId: small,
        parentId: null,
        line: { kind: "item" as const, number: "010" },
        field: "dragCoefficient",
      },
      ...{ text: "Which gauge?", suggestion: null, asksForAction: true, to: [] },
    };
    const { remarkId, number } = await addRemark(ines, { ...remark, key: formKey() }, clock);
    expect(number).toBe(1);
    await refusedAct(() => approves(elske, small, "reviewer", clock), "unsettled_request", "approve_proposal");
    for (const actor of [tansy, odo, elske]) {
      await refusedAct(() => settleRemark(actor, { remarkId, reason: "Done." }, clock), "forbidden", "settle_remark");
    }
    await settleRemark(lusia, { remarkId, reason: "The gauge is named in the evidence." }, clock);
    expect(await approves(elske, small, "reviewer", clock)).toMatchObject({ state: "approved" });
  });

  it("refuses a sheet that moved, and lets the signer sign what stands there now", async () => {
    const people = await withItem();
    const { ines, odo, elske, small, clock } = people;
    const shown = await approval(small, "reviewer", clock);
    const other = await proposed(odo, clock, { edits: [revising("020", "–", odo.userId, 0.29)] });
    await approves(elske, other, "reviewer", clock);
    await refusedAct(() => signProposal(ines, shown, clock), "moved", "approve_proposal");
    expect(await approves(ines, small, "reviewer", clock)).toMatchObject({ state: "approved" });
  });

  it("refuses an approval that is overtaken, and tells its editors once", async () => {
    const people = await withItem();
    const { tansy, fenno, ines, elske, small, clock } = people;
    const other = await proposed(fenno, clock, { edits: [revising("010", "–", tansy.userId, 0.48)] });
    await approves(elske, other, "reviewer", clock);
    await refusedAct(() => approves(ines, small, "reviewer", clock), "overtaken", "approve_proposal");
    const mails = await OutboxMessage.findAll({ where: { template: "overtaken" } });
    expect(mails.map(({ toUserId }) => toUserId)).toEqual([tansy.userId]);
  });

  it("lets an approval be taken back until the last signature, by its signer alone", async () => {
    const people = await team();
    const { tansy, ines, elske, lusia, clock } = people;
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    await approves(ines, proposalId, "reviewer", clock);
    const back = { proposalId, reason: "I read the wrong column." };
    await refusedAct(() => takeBackApproval(elske, back, clock), "wrong_state", "take_back_approval");
    await takeBackApproval(ines, back, clock);
    expect(await approves(lusia, proposalId, "program_manager", clock)).toEqual({ state: "proposed", issue: null });
    expect(await approves(ines, proposalId, "reviewer", clock)).toEqual({ state: "approved", issue: 2 });
    await refusedAct(() => takeBackApproval(ines, back, clock), "wrong_state", "take_back_approval");
  });

  it("answers the same form twice with the same answer and does nothing new", async () => {
    const people = await team();
    const { tansy, clock } = people;
    const draft = await startDraft(tansy, { productCode: CODE, title: "", key: formKey() }, clock);
    const { proposalId } = draft;
    const typed = content({ edits: [adding("010", tansy.userId, 0.5)] });
    await saveDraft(tansy, { proposalId, lockVersion: 0, content: typed }, clock);
    const input = { proposalId, lockVersion: 1, key: formKey(), password: null };
    const [one, two] = await Promise.all([propose(tansy, input, clock), propose(tansy, input, clock)]);
    expect(one).toEqual({ key: "1", number: 1, round: 1 });
    expect(two).toEqual(one);
    expect(await Round.count()).toBe(1);
    const nothingNew = { ...input, lockVersion: 2, key: formKey() };
    await expect(propose(tansy, nothingNew, clock)).rejects.toMatchObject({ code: "invalid" });
    const remark = {
      ...{
        proposalId,
        parentId: null,
        line: null,
        field: null,
        text: "Seen.",
        suggestion: null,
        asksForAction: false,
        to: [],
      },
      key: formKey(),
    };
    const first = await addRemark(people.ines, remark, clock);
    const entries = (await historyPage({ chain: CODE })).rows.length;
    expect(await addRemark(people.ines, remark, clock)).toEqual(first);
    expect((await historyPage({ chain: CODE })).rows.length).toBe(entries);
  });
});

describe("two persons at one moment", () => {
  it("counts exactly one of two signatures in one capacity", async () => {
    const people = await team();
    const { tansy, ines, elske, clock } = people;
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    const sheet = await approval(proposalId, "reviewer", clock);
    const outcomes = await Promise.allSettled([signProposal(ines, sheet, clock), signProposal(elske, sheet, clock)]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    expect(outcomes.find((outcome) => outcome.status === "rejected")).toMatchObject({
      reason: { code: "capacity_taken" },
    });
    expect(await Signature.count({ where: { subjectType: "round" } })).toBe(1);
  });

  it("makes one issue of two last signatures", async () => {
    const { ines, elske, small, clock } = await withItem();
    const sheet = await approval(small, "reviewer", clock);
    const outcomes = await Promise.allSettled([signProposal(ines, sheet, clock), signProposal(elske, sheet, clock)]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(["fulfilled", "rejected"]);
    expect(await Issue.max("number")).toBe(3);
  });
});
