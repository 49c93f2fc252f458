import { addRemark } from "@/lib/proposals/remarks/add-remark";
import { carryForward } from "@/lib/proposals/submitting/carry-forward";
import { propose } from "@/lib/proposals/submitting/propose";
import { settlementView } from "@/lib/proposals/queries";
import { raiseObjection } from "@/lib/proposals/signing/raise-objection";
import { returnProposal } from "@/lib/proposals/signing/return-proposal";
import { saveDraft } from "@/lib/proposals/drafting/save-draft";
import { settleRemark } from "@/lib/proposals/remarks/settle-remark";
import { shareDraft } from "@/lib/proposals/drafting/share-draft";
import { signProposal } from "@/lib/proposals/signing/sign-proposal";
import { startDraft } from "@/lib/proposals/drafting/start-draft";
import { takeBackApproval } from "@/lib/proposals/signing/take-back-approval";
import { withdrawProposal } from "@/lib/proposals/submitting/withdraw-proposal";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { Comment } from "@/models/comment";
import { Proposal } from "@/models/proposal";
import { newestBudget } from "@/tests/support/budget-on-file";
import { rows } from "@/tests/support/invariants/rows";
import { approval, CODE, formKey, PASSWORD, reviewOf } from "../review-cycle";
import { typed, type Desk, type Picture } from "./desk";
import type { ModelState } from "./model-state";

const DAY_MS = 86_400_000;

/** The product's commands on the open database. */
export function databaseDesk(people: Record<string, Actor>, first: string): Desk {
  let moment = Date.parse(first);
  const clock: Clock = () => new Date((moment += 1000));
  const ids = Object.fromEntries(Object.entries(people).map(([name, { userId }]) => [name, userId]));
  const names = Object.fromEntries(Object.entries(ids).map(([name, id]) => [id, name]));
  const proposals: number[] = [];
  const idOf = (proposal: number) => proposals[proposal] ?? 0;
  const actor = (who: string) => {
    const person = people[who];
    if (!person) throw new Error(`there is nobody named ${who}`);
    return person;
  };
  const stored = (proposal: number) => Proposal.findByPk(idOf(proposal), { rejectOnEmpty: true });
  const reason = "At random, as all here.";

  return {
    passDays: (days) => void (moment += days * DAY_MS),
    start: (who) =>
      allowed(async () => {
        const input = { productCode: CODE, title: "", key: formKey() };
        proposals.push((await startDraft(actor(who), input, clock)).proposalId);
      }),
    save: (who, proposal, content) =>
      allowed(async () => {
        const { id: proposalId, lockVersion } = await stored(proposal);
        const { state } = await newestBudget(CODE);
        const saved = await saveDraft(
          actor(who),
          { proposalId, lockVersion, content: typed(content, state, ids) },
          clock,
        );
        if (saved.outcome !== "saved") throw new Error("nobody else saves meanwhile");
      }),
    propose: (who, proposal) =>
      allowed(async () => {
        const { id: proposalId, lockVersion } = await stored(proposal);
        await propose(actor(who), { proposalId, lockVersion, key: formKey(), password: PASSWORD }, clock);
      }),
    approve: (who, proposal, capacity) =>
      allowed(async () => {
        if ((await stored(proposal)).round === 0) throw new Refusal("wrong_state", "There is no sheet to sign.");
        await signProposal(actor(who), await approval(idOf(proposal), capacity, clock), clock);
      }),
    sendBack: (who, proposal, capacity) =>
      allowed(async () => {
        if ((await stored(proposal)).round === 0) throw new Refusal("wrong_state", "There is no sheet to return.");
        const { roundHash, proposalId } = await approval(idOf(proposal), capacity, clock);
        await returnProposal(actor(who), { proposalId, roundHash, capacity, deputyForId: null, reason }, clock);
      }),
    disapprove: (who, proposal) =>
      allowed(async () => {
        if ((await stored(proposal)).round === 0) throw new Refusal("wrong_state", "There is no sheet to sign.");
        const { round, textHash } = await reviewOf(idOf(proposal), clock);
        const shown = { proposalId: idOf(proposal), roundHash: round.hash, textHash, deputyForId: null };
        const decision = { decision: "disapprove", capacity: "program_manager", reason, password: PASSWORD } as const;
        await signProposal(actor(who), { ...shown, ...decision }, clock);
      }),
    takeBack: (who, proposal) =>
      allowed(() => takeBackApproval(actor(who), { proposalId: idOf(proposal), reason }, clock)),
    withdraw: (who, proposal) =>
      allowed(() => withdrawProposal(actor(who), { proposalId: idOf(proposal), reason }, clock)),
    share: (who, proposal, to) =>
      allowed(() => shareDraft(actor(who), { proposalId: idOf(proposal), userId: ids[to] ?? 0 }, clock)),
    ask: (who, proposal) =>
      allowed(async () => {
        const place = { proposalId: idOf(proposal), parentId: null, line: null, field: null, suggestion: null, to: [] };
        await addRemark(actor(who), { ...place, text: "Look here.", asksForAction: true, key: formKey() }, clock);
      }),
    settle: (who, proposal, request) =>
      allowed(async () => {
        const remark = await Comment.findOne({
          where: { proposalId: idOf(proposal), number: request + 1 },
          rejectOnEmpty: true,
        });
        await settleRemark(actor(who), { remarkId: remark.id, reason: "Seen." }, clock);
      }),
    object: (who, proposal) =>
      allowed(() => raiseObjection(actor(who), { proposalId: idOf(proposal), reason, key: formKey() }, clock)),
    carry: (who, proposal, side) =>
      allowed(async () => {
        const { id: proposalId, number } = await stored(proposal);
        const shown = await settlementView(actor(who), CODE, number === null ? `draft-${proposalId}` : String(number));
        const settled = shown.conflicts.map(({ kind, number: line, field }) => ({
          ...{ kind, number: line, field, choice: side, why: "Chosen at random." },
        }));
        const { lockVersion, ontoIssue } = shown;
        await carryForward(actor(who), { proposalId, lockVersion, ontoIssue, settled, key: formKey() }, clock);
      }),
    picture: () => picture(proposals, names),
  };
}

/** A refusal is an answer; anything else that is thrown is a bug. */
async function allowed(act: () => Promise<unknown>): Promise<boolean> {
  try {
    await act();
    return true;
  } catch (problem) {
    if (problem instanceof Refusal) return false;
    throw problem;
  }
}

/** Read from the rows, past the product's own reading. */
async function picture(proposals: readonly number[], names: Record<number, string>): Promise<Picture> {
  const issues = await rows<{ number: number }>("SELECT number FROM issues ORDER BY number");
  const states = await rows<{ id: number; state: ModelState; rounds: number }>(
    "SELECT p.id, p.state, (SELECT count(*) FROM rounds WHERE proposal_id = p.id) AS rounds FROM proposals p",
  );
  const lines = await rows<{ kind: string; number: string; retired: number; body: string; revision: number }>(
    `SELECT l.kind, l.number, r.retired, r.body,
       (SELECT count(*) - 1 FROM line_revisions WHERE line_id = l.id) AS revision
     FROM lines l JOIN line_revisions r ON r.line_id = l.id
     WHERE r.issue = (SELECT max(issue) FROM line_revisions WHERE line_id = l.id)`,
  );
  const bodyOf = (kind: string) => JSON.parse(lines.find((line) => line.kind === kind)?.body ?? "null");
  const sheet: { rows: { kind: string; number: string; hundredths: number }[]; unallocatedHundredths: number } =
    bodyOf("allocations");
  const items = lines
    .filter(({ kind }) => kind === "item")
    .map(({ number, retired, body, revision }) => {
      const { ownerId, force, group } = JSON.parse(body);
      const item = {
        owner: names[ownerId] ?? "",
        force: Math.round(force.value * 100),
        group,
        retired: retired === 1,
        revision,
      };
      return [number, item] as const;
    });
  return {
    issues: issues.length,
    proposals: proposals.map((id) => {
      const { state, rounds } = states.find((each) => each.id === id) ?? { state: "draft", rounds: -1 };
      return { state, rounds };
    }),
    limit: bodyOf("operating_point").limitHundredths,
    reserve: bodyOf("terms").reserves[0].hundredths,
    rows: Object.fromEntries(sheet.rows.map(({ kind, number, hundredths }) => [`${kind} ${number}`, hundredths])),
    unallocated: sheet.unallocatedHundredths,
    items: Object.fromEntries(items),
  };
}
