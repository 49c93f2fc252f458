import { describe, expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { nameReviewer } from "@/lib/proposals/signing/name-reviewer";
import { proposalView } from "@/lib/proposals/queries";
import { remindSigners } from "@/lib/proposals/notices/remind-signers";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { shareDraft } from "@/lib/proposals/drafting/share-draft";
import { signProposal } from "@/lib/proposals/signing/sign-proposal";
import { inTransaction } from "@/models/database";
import { Deputy } from "@/models/deputy";
import { OutboxMessage } from "@/models/outbox-message";
import { Proposal } from "@/models/proposal";
import { Signature } from "@/models/signature";
import { withDatabase } from "@/tests/support/database";
import { withRole } from "@/tests/support/people";
import {
  adding,
  approval,
  approvedItems,
  approves,
  CODE,
  content,
  proposed,
  reviewOf,
  revising,
  team,
  type Team,
} from "./review-cycle";

withDatabase();

async function deputise({ lusia }: Team, holderId: number, deputyId: number, fromDay: string, untilDay: string) {
  const productId = lusia.memberships[0]?.productId ?? 0;
  const named = { productId, holderId, deputyId, fromDay, untilDay, namedById: holderId };
  await inTransaction((tx) => Deputy.create({ ...named, namedAt: "2026-02-01T08:00:00.000Z" }, { transaction: tx }));
}

describe("signing", () => {
  it("keeps the text as it was shown with signer, meaning and time, under its own hash", async () => {
    const people = await team();
    const { tansy, ines, clock } = people;
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    const { text, textHash, round } = await reviewOf(proposalId, clock);
    await approves(ines, proposalId, "reviewer", clock);
    const { canonicalText } = await Signature.findOne({ where: { signerId: ines.userId }, rejectOnEmpty: true });
    expect(canonicalText.startsWith(text)).toBe(true);
    for (const part of [
      round.hash,
      textHash,
      "printed name: Ines Reviewer",
      "meaning: Checked",
      "capacity: reviewer",
    ]) {
      expect(canonicalText).toContain(part);
    }
    expect(text).toContain("add item 010 (Mirror), revision –");
    expect(text).toContain("program manager, 1");
  });

  it("disapproves by a program manager alone, also where theirs is not required", async () => {
    const people = await team();
    const { tansy, ines, lusia, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)]);
    const small = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.49)] });
    const { roundHash, textHash, password } = await approval(small, "reviewer", clock);
    const no = {
      ...{ proposalId: small, roundHash, textHash, password, decision: "disapprove" as const },
      ...{ capacity: "program_manager" as const, deputyForId: null, reason: "The risk is larger than the saving." },
    };
    await expect(signProposal(ines, no, clock)).rejects.toMatchObject({ code: "forbidden" });
    expect(await signProposal(lusia, no, clock)).toEqual({ state: "disapproved", issue: null });
    const mails = await OutboxMessage.findAll({ where: { template: "disapproved" } });
    expect(mails.map(({ toUserId }) => toUserId)).toEqual([tansy.userId]);
  });

  it("only grows what is asked for within a round: a step down that another approval took away stays signed for", async () => {
    // Limit 30 N, reserve 5 N; one unit of C_D predicts 382.8 · 0.1 · 1.2 = 45.94 N: at first 24.90 N, inside by 0.10 N.
    const people = await team(3000, 500);
    const { tansy, odo, fenno, lusia, ines, elske, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5), adding("020", odo.userId, 0.042)], fenno);
    const mine = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.506)] });
    const reasons = async () =>
      (await reviewOf(mine, clock)).required.flatMap((each) => each.reasons.map(({ rule }) => rule));
    expect(await reasons()).toEqual(["reviewer", "standingWorse"]);

    const other = await proposed(odo, clock, { edits: [revising("020", "–", odo.userId, 0.03)] });
    expect(await approves(ines, other, "reviewer", clock)).toMatchObject({ state: "approved" });
    const { onToday } = await reviewOf(mine, clock);
    expect(onToday.routing.map(({ capacity }) => capacity)).toEqual(["reviewer"]);
    expect(await reasons()).toEqual(["reviewer", "standingWorse"]);
    expect(await approves(elske, mine, "reviewer", clock)).toMatchObject({ issue: null });
    expect(await approves(lusia, mine, "program_manager", clock)).toMatchObject({ issue: 4 });
  });

  it("asks a program manager as soon as another approval makes the same change worse, and tells them", async () => {
    const people = await team(3000, 500);
    const { tansy, odo, fenno, ines, elske, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5), adding("020", odo.userId, 0.035)], fenno);
    const mine = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.506)] });
    expect((await reviewOf(mine, clock)).required.map(({ capacity }) => capacity)).toEqual(["reviewer"]);
    const other = await proposed(odo, clock, { edits: [revising("020", "–", odo.userId, 0.041)] });
    expect(await approves(ines, other, "reviewer", clock)).toMatchObject({ state: "approved" });
    expect(await approves(elske, mine, "reviewer", clock)).toEqual({ state: "proposed", issue: null });
    const told = await OutboxMessage.findAll({ where: { template: "proposed", toUserId: fenno.userId } });
    expect(told.filter(({ key }) => key.startsWith(`proposal ${mine},`))).toHaveLength(1);
  });

  it("sums slices: what was approved for the item within 30 days counts along until a manager signed", async () => {
    const people = await team();
    const { tansy, ines, elske, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)]);
    // Each slice is ΔC_D 0.015, 0.69 N of 100 N: below 1 % alone, above it together.
    const first = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.515)] });
    expect(await approves(ines, first, "reviewer", clock)).toMatchObject({ state: "approved" });
    const second = await proposed(tansy, clock, { edits: [revising("010", "A", tansy.userId, 0.53)] });
    expect(await approves(elske, second, "reviewer", clock)).toEqual({ state: "proposed", issue: null });
  });

  it("keeps signers from editing what they signed, and from being named co-editors", async () => {
    const people = await team();
    const { tansy, lusia, fenno, clock } = people;
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    await shareDraft(tansy, { proposalId, userId: lusia.userId }, clock);
    await approves(lusia, proposalId, "program_manager", clock);
    const { lockVersion } = await Proposal.findByPk(proposalId, { rejectOnEmpty: true });
    const typed = content({ edits: [adding("010", tansy.userId, 0.4)] });
    await expect(saveDraft(lusia, { proposalId, lockVersion, content: typed }, clock)).rejects.toMatchObject({
      code: "not_independent",
    });

    const other = await proposed(tansy, clock, { edits: [adding("020", tansy.userId, 0.1)] });
    await approves(fenno, other, "program_manager", clock);
    await expect(shareDraft(tansy, { proposalId: other, userId: fenno.userId }, clock)).rejects.toMatchObject({
      code: "invalid",
    });
  });

  it("keeps a co-editor who edited from signing what they could otherwise sign", async () => {
    const people = await team();
    const { tansy, fenno, clock } = people;
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    await shareDraft(tansy, { proposalId, userId: fenno.userId }, clock);
    const { lockVersion } = await Proposal.findByPk(proposalId, { rejectOnEmpty: true });
    const typed = content({ edits: [adding("010", tansy.userId, 0.4)] });
    await saveDraft(fenno, { proposalId, lockVersion, content: typed }, clock);
    await expect(approves(fenno, proposalId, "program_manager", clock)).rejects.toMatchObject({
      code: "not_independent",
    });
  });

  it("lets only the named reviewer fill the capacity, and everybody again when the name is taken off", async () => {
    const people = await team();
    const { tansy, ines, elske, lusia, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)]);
    const small = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.49)] });
    const elskeAlone = { proposalId: small, userId: elske.userId, reason: "" };
    await expect(nameReviewer(ines, elskeAlone, clock)).rejects.toMatchObject({ code: "forbidden" });
    await nameReviewer(lusia, elskeAlone, clock);
    await expect(approves(ines, small, "reviewer", clock)).rejects.toMatchObject({ code: "forbidden" });
    expect((await proposalView(ines, CODE, "2", undefined, clock))?.moves.return.allowed).toBe(true);
    await nameReviewer(lusia, { proposalId: small, userId: null, reason: "Elske is ill" }, clock);
    expect(await approves(ines, small, "reviewer", clock)).toMatchObject({ state: "approved" });
  });

  it("names another reviewer for one who is away with a reason, which stands on the sheet and in the history", async () => {
    const people = await team();
    const { tansy, ines, elske, lusia, clock } = people;
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    await nameReviewer(lusia, { proposalId, userId: elske.userId, reason: "" }, clock);
    const instead = { proposalId, userId: ines.userId, reason: "" };
    await expect(nameReviewer(lusia, instead, clock)).rejects.toMatchObject({
      code: "invalid",
      faults: [{ path: "reason" }],
    });
    await nameReviewer(lusia, { ...instead, reason: "Elske is away until May" }, clock);

    const sheet = await proposalView(ines, CODE, "1", undefined, clock);
    expect(sheet?.namedBecause).toBe("Elske is away until May");
    expect(sheet?.routing?.capacities[0]).toMatchObject({
      named: { name: "Ines Reviewer" },
      couldName: [{ name: "Elske Reviewer" }, { name: "Ines Reviewer" }],
    });
    expect((await historyPage({ chain: CODE })).rows[0]).toMatchObject({
      act: "name_reviewer",
      reason: "Elske is away until May",
    });
  });
});

describe("deputies", () => {
  it("sign for the holder on a day they are named for; both names stand on the signature", async () => {
    const people = await team();
    const { tansy, odo, ines, lusia, clock } = people;
    await deputise(people, ines.userId, odo.userId, "2026-03-01", "2026-03-07");
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    expect((await proposalView(odo, CODE, "1", undefined, clock))?.deputyFor).toEqual([
      { capacity: "reviewer", person: { id: ines.userId, name: "Ines Reviewer" } },
    ]);
    const sheet = { ...(await approval(proposalId, "reviewer", clock)), deputyForId: ines.userId };
    await signProposal(odo, sheet, clock);
    expect(await Signature.findOne({ where: { signerId: odo.userId } })).toMatchObject({
      printedName: "Odo Owner",
      deputyForName: "Ines Reviewer",
    });
    expect((await historyPage({ chain: CODE, act: "approve_proposal" })).rows).toMatchObject([
      { printedName: "Odo Owner", capacity: "reviewer", now: { deputyFor: "Ines Reviewer" } },
    ]);
    expect(await approves(lusia, proposalId, "program_manager", clock)).toMatchObject({ state: "approved" });
  });

  it("cannot sign on another day, for somebody who did not name them, or for a barred person", async () => {
    const people = await team();
    const { tansy, odo, ines, elske, lusia, fenno, clock } = people;
    await deputise(people, ines.userId, odo.userId, "2026-03-02", "2026-03-07");
    await deputise(people, fenno.userId, lusia.userId, "2026-03-01", "2026-03-07");
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    const sheet = await approval(proposalId, "reviewer", clock);
    for (const deputyForId of [ines.userId, elske.userId]) {
      await expect(signProposal(odo, { ...sheet, deputyForId }, clock)).rejects.toMatchObject({ code: "forbidden" });
    }
    const own = await proposed(fenno, clock, { edits: [adding("020", odo.userId, 0.1)] });
    const forFenno = { ...(await approval(own, "program_manager", clock)), deputyForId: fenno.userId };
    await expect(signProposal(lusia, forFenno, clock)).rejects.toMatchObject({ code: "not_independent" });
    expect(await approves(lusia, own, "program_manager", clock)).toMatchObject({ issue: null });
  });

  it("do not lend one person a second capacity", async () => {
    const people = await team();
    const { tansy, lusia, ines, clock } = people;
    const both = await withRole(lusia, CODE, "reviewer");
    await deputise(people, ines.userId, lusia.userId, "2026-03-01", "2026-03-07");
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    await approves(both, proposalId, "program_manager", clock);
    const sheet = await approval(proposalId, "reviewer", clock);
    for (const deputyForId of [null, ines.userId]) {
      await expect(signProposal(both, { ...sheet, deputyForId }, clock)).rejects.toMatchObject({
        code: "capacity_taken",
      });
    }
  });
});

describe("a needed-by date that passes", () => {
  it("reminds the signers once, then the program managers, and approves nothing", async () => {
    const people = await team();
    const { tansy, ines, elske, lusia, fenno, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)]);
    const edits = [revising("010", "–", tansy.userId, 0.49)];
    const proposalId = await proposed(tansy, clock, { edits, neededBy: "2026-03-05" });
    const reminded = async () =>
      (await OutboxMessage.findAll({ where: { template: "reminder" }, order: [["id", "ASC"]] })).map(
        ({ toUserId }) => toUserId,
      );
    await remindSigners(() => new Date("2026-03-05T20:00:00.000Z"));
    expect(await reminded()).toEqual([]);
    for (const hour of ["08", "09"]) await remindSigners(() => new Date(`2026-03-06T${hour}:00:00.000Z`));
    expect(await reminded()).toEqual([elske.userId, ines.userId]);
    // Saturday to Monday: no reminder on days off, and the second working day after the date.
    for (const day of ["07", "08", "09"]) await remindSigners(() => new Date(`2026-03-${day}T08:00:00.000Z`));
    expect(await reminded()).toEqual([elske.userId, ines.userId]);
    await remindSigners(() => new Date("2026-03-10T08:00:00.000Z"));
    expect(await reminded()).toEqual([elske.userId, ines.userId, fenno.userId, lusia.userId]);
    expect(await Proposal.findByPk(proposalId)).toMatchObject({ state: "proposed" });
  });
});
