import { describe, expect, it } from "vitest";
import { verifyChain } from "@/lib/audit/verify-chain";
import { addRemark } from "@/lib/proposals/remarks/add-remark";
import { carryForward } from "@/lib/proposals/submitting/carry-forward";
import { propose } from "@/lib/proposals/submitting/propose";
import { settlementView } from "@/lib/proposals/queries";
import { returnProposal } from "@/lib/proposals/signing/return-proposal";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { settleRemark } from "@/lib/proposals/remarks/settle-remark";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { takeBackApproval } from "@/lib/proposals/signing/take-back-approval";
import { storedChange } from "@/lib/proposals/records/working-copy";
import { withdrawProposal } from "@/lib/proposals/submitting/withdraw-proposal";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Comment } from "@/models/comment";
import { inSnapshot } from "@/models/database";
import { Proposal } from "@/models/proposal";
import { newestBudget } from "@/tests/support/budget-on-file";
import { withDatabase } from "@/tests/support/database";
import { invariantFaults } from "@/tests/support/invariants/check-invariants";
import {
  adding,
  approval,
  approves,
  CODE,
  content,
  editOf,
  formKey,
  PASSWORD,
  revising,
  team,
  type Team,
} from "./review-cycle";

withDatabase();

/** The same numbers on every run (Numerical Recipes' congruential generator). */
function numbers(seed: number) {
  let state = seed;
  const next = () => (state = (Math.imul(state, 1664525) + 1013904223) >>> 0) / 2 ** 32;
  return { below: (count: number) => Math.floor(next() * count) };
}
type Numbers = ReturnType<typeof numbers>;

function one<T>(random: Numbers, of: readonly T[]): T {
  const chosen = of[random.below(of.length)];
  if (chosen === undefined) throw new Error("nothing to choose from");
  return chosen;
}

/** A change that may or may not be allowed, complete or possible. */
async function someContent(random: Numbers, actor: Actor, people: Team) {
  const { state } = await newestBudget(CODE);
  const items = state.lines.filter(({ kind }) => kind === "item");
  const coefficient = (1 + random.below(12)) / 20;
  const number = `${1 + random.below(12)}0`.padStart(3, "0");
  const known = items.find((line) => line.number === number);
  const holder = { kind: "item" as const, number };
  const unallocated = { kind: "unallocated" as const, number: null };
  const hundredths = 1 + random.below(4000);
  const owner = one(random, [actor, people.tansy, people.odo]).userId;
  const retire = editOf({ operation: "retire", kind: "item", number, baseLetter: known?.letter ?? "–", body: null });
  const edit = !known ? adding(number, owner, coefficient) : revising(number, known.letter, owner, coefficient);
  return content(
    one(random, [
      { edits: [edit] },
      { edits: [edit] },
      { edits: known ? [retire] : [edit] },
      { transfers: [{ giver: unallocated, receiver: holder, hundredths }] },
      { transfers: [{ giver: holder, receiver: unallocated, hundredths }] },
      { edits: [edit], transfers: [{ giver: unallocated, receiver: holder, hundredths }] },
    ]),
  );
}

async function submits(random: Numbers, actor: Actor, people: Team) {
  const { clock } = people;
  const { proposalId } = await startDraft(actor, { productCode: CODE, title: "", key: formKey() }, clock);
  const typed = await someContent(random, actor, people);
  await saveDraft(actor, { proposalId, lockVersion: 0, content: typed }, clock);
  await propose(actor, { proposalId, lockVersion: 1, key: formKey(), password: PASSWORD }, clock);
}

/** The same lines with another coefficient, or something else altogether. */
async function revises(random: Numbers, actor: Actor, people: Team, proposal: Proposal) {
  const { id: proposalId, lockVersion } = proposal;
  const stored = await inSnapshot((tx) => storedChange({ proposalId }, tx));
  const coefficient = (1 + random.below(12)) / 20;
  const edits = stored.edits.map((edit) =>
    edit.body === null ? edit : { ...edit, body: { ...edit.body, dragCoefficient: coefficient } },
  );
  const typed = one(random, [content({ ...stored, edits }), await someContent(random, actor, people)]);
  await saveDraft(actor, { proposalId, lockVersion, content: typed }, people.clock);
  const input = { proposalId, lockVersion: lockVersion + 1, key: formKey(), password: PASSWORD };
  await propose(actor, input, people.clock);
}

async function carries(random: Numbers, actor: Actor, people: Team, proposal: Proposal) {
  const { conflicts, lockVersion, ontoIssue } = await settlementView(actor, CODE, String(proposal.number));
  const settled = conflicts.map(({ kind, number, field }) => ({
    ...{ kind, number, field, why: "Chosen at random." },
    choice: one(random, ["base", "theirs", "yours"] as const),
  }));
  const input = { proposalId: proposal.id, lockVersion, ontoIssue, settled, key: formKey() };
  await carryForward(actor, input, people.clock);
}

async function returns(actor: Actor, people: Team, proposal: Proposal) {
  const { roundHash } = await approval(proposal.id, "reviewer", people.clock);
  const words = { capacity: "reviewer" as const, deputyForId: null, reason: "Look at it again." };
  await returnProposal(actor, { proposalId: proposal.id, roundHash, ...words }, people.clock);
}

async function remarks(random: Numbers, actor: Actor, people: Team, proposal: Proposal) {
  const words = { suggestion: null, text: "Look here.", asksForAction: random.below(3) === 0, to: [] };
  const place = { proposalId: proposal.id, parentId: null, line: null, field: null };
  await addRemark(actor, { ...place, ...words, key: formKey() }, people.clock);
}

async function settles(random: Numbers, actor: Actor, people: Team) {
  const open = await Comment.findAll({ where: { asksAction: true, settledAt: null } });
  if (open.length > 0) await settleRemark(actor, { remarkId: one(random, open).id, reason: "Seen." }, people.clock);
}

/** One act of somebody who may have no right to it; every refusal is fine, anything else thrown is a bug. */
async function step(random: Numbers, people: Team): Promise<string> {
  const { tansy, odo, ines, elske, lusia, fenno, maud, clock } = people;
  const anybody = () => one(random, [tansy, odo, ines, elske, lusia, fenno, maud]);
  const author = one(random, [tansy, odo, tansy, odo, lusia, fenno]);
  const proposedNow = await Proposal.findAll({ where: { state: "proposed" } });
  const returned = await Proposal.findAll({ where: { state: "returned" } });
  const open = [...proposedNow, ...proposedNow, ...proposedNow, ...returned];
  const reason = "At random, as all here.";
  const submit = () => submits(random, author, people);
  const acts: [string, () => Promise<unknown>][] = [
    ["submit", submit],
    ["submit", submit],
    ["submit", submit],
  ];
  if (open.length > 0) {
    const proposal = one(random, open);
    const proposalId = proposal.id;
    const proposer = [tansy, odo, lusia, fenno].find(({ userId }) => userId === proposal.proposerId) ?? author;
    const reviewer = one(random, [ines, elske]);
    const manager = one(random, [lusia, fenno]);
    const signs = (person: Actor, capacity: "reviewer" | "program_manager") => () =>
      approves(person, proposalId, capacity, clock);
    const carry = () => carries(random, one(random, [proposer, proposer, author]), people, proposal);
    const [asReviewer, asManager] = [signs(reviewer, "reviewer"), signs(manager, "program_manager")];
    acts.push(
      ...[asReviewer, asReviewer, asReviewer, asManager, asManager, asManager].map((act): [string, typeof act] => [
        "approve",
        act,
      ]),
      ["approve wrongly", signs(anybody(), one(random, ["reviewer", "program_manager"] as const))],
      ["revise", () => revises(random, one(random, [proposer, proposer, author]), people, proposal)],
      ["carry forward", carry],
      ["carry forward", carry],
      ["return", () => returns(one(random, [reviewer, anybody()]), people, proposal)],
      ["take back", () => takeBackApproval(one(random, [reviewer, manager]), { proposalId, reason }, clock)],
      ["withdraw", () => withdrawProposal(anybody(), { proposalId, reason }, clock)],
      ["remark", () => remarks(random, anybody(), people, proposal)],
      ["settle", () => settles(random, one(random, [ines, elske, lusia, fenno]), people)],
      ["settle", () => settles(random, one(random, [ines, elske, lusia, fenno]), people)],
    );
  }
  const [name, act] = one(random, acts);
  try {
    await act();
    return `${name}: done`;
  } catch (problem) {
    if (!(problem instanceof Refusal)) throw problem;
    return `${name}: ${problem.code}`;
  }
}

describe("a long walk of acts by chance, allowed and not", () => {
  it("keeps every invariant, recounted from the rows, and a chain without faults", async () => {
    const people = await team();
    const random = numbers(20_260_301);
    const outcomes: string[] = [];
    for (let count = 0; count < 250; count += 1) outcomes.push(await step(random, people));

    expect(await invariantFaults()).toEqual([]);
    expect(await verifyChain(CODE)).toMatchObject({ faults: [] });
    // The walk is worth something only if it went through approvals, rounds and refusals of several kinds.
    const tally = new Set(outcomes);
    for (const act of ["submit", "approve", "revise", "carry forward", "return", "withdraw", "settle", "take back"]) {
      expect([...tally]).toContain(`${act}: done`);
    }
    for (const code of ["forbidden", "not_independent", "overtaken", "unsettled_request", "capacity_taken"]) {
      expect([...tally].some((outcome) => outcome.endsWith(code))).toBe(true);
    }
    expect((await newestBudget(CODE)).issue).toBeGreaterThan(10);
  }, 300_000);
});
