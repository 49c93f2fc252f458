import { describe, expect, it } from "vitest";
import { historyPage } from "@/lib/audit/queries";
import { verifyChain } from "@/lib/audit/verify-chain";
import { OutboxMessage } from "@/models/outbox-message";
import { Proposal } from "@/models/proposal";
import { newestBudget } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { adding, approvedItems, approves, CODE, proposed, reviewOf, revising, team } from "./review-cycle";

withDatabase();

// Air at 15 °C and 25 m/s: q = 0.5 · 1.225 · 625 = 382.8 Pa (ISO 2533); A = 0.1 m².
const Q_AREA = 38.28;

describe("the whole cycle of a proposal", () => {
  it("goes from draft to the next issue by a reviewer and a program manager, in either order", async () => {
    const people = await team();
    const { tansy, ines, lusia, clock } = people;
    const proposalId = await proposed(tansy, clock, { edits: [adding("010", tansy.userId, 0.5)] });
    expect(await Proposal.findByPk(proposalId)).toMatchObject({ state: "proposed", number: 1, round: 1 });

    expect(await approves(lusia, proposalId, "program_manager", clock)).toEqual({ state: "proposed", issue: null });
    expect(await approves(ines, proposalId, "reviewer", clock)).toEqual({ state: "approved", issue: 2 });

    const budget = await newestBudget(CODE);
    expect(budget.issue).toBe(2);
    expect(budget.results.points[0]?.totals.basic).toBeCloseTo(0.5 * Q_AREA, 1);
    expect(await Proposal.findByPk(proposalId)).toMatchObject({ state: "approved" });
  });

  it("needs a reviewer alone for a small change of an owner's own item", async () => {
    const people = await team();
    const { tansy, elske, clock } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)]);
    const small = await proposed(tansy, clock, { edits: [revising("010", "–", tansy.userId, 0.49)] });
    expect((await reviewOf(small, clock)).routing.map(({ capacity }) => capacity)).toEqual(["reviewer"]);
    expect(await approves(elske, small, "reviewer", clock)).toEqual({ state: "approved", issue: 3 });
    const line = (await newestBudget(CODE)).state.lines.find(({ kind, number }) => kind === "item" && number === "010");
    expect(line).toMatchObject({ letter: "A", issue: 3 });
  });

  it("stands in the history act by act, tells everybody once, and leaves a chain without faults", async () => {
    const people = await team();
    const { tansy } = people;
    await approvedItems(people, [adding("010", tansy.userId, 0.5)]);
    const { rows } = await historyPage({ chain: CODE });
    const acts = rows.map(({ act, printedName, outcome }) => [act, printedName, outcome]);
    expect(acts.slice(0, 4)).toEqual([
      ["approve_proposal", "Lusia Manager", "done"],
      ["approve_proposal", "Ines Reviewer", "done"],
      ["propose", "Tansy Owner", "done"],
      ["start_draft", "Tansy Owner", "done"],
    ]);
    const mails = await OutboxMessage.findAll({ order: [["id", "ASC"]] });
    expect(mails.map(({ template, toUserId }) => [template, toUserId])).toEqual([
      ["proposed", people.elske.userId],
      ["proposed", people.ines.userId],
      ["proposed", people.fenno.userId],
      ["proposed", people.lusia.userId],
      ["signed", tansy.userId],
      ["approved", tansy.userId],
      ["approved", people.ines.userId],
    ]);
    expect(await verifyChain(CODE)).toMatchObject({ faults: [] });
  });
});
