import { performAct } from "@/lib/audit/perform-act";
import { loadNewestBudget } from "@/lib/budget/load-budget";
import type { LineState } from "@/lib/evaluation/lines/line-state";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal, type FieldFault } from "@/lib/vocabulary/refusal";
import { inSnapshot, inTransaction } from "@/models/database";
import { Proposal } from "@/models/proposal";
import { authorize } from "@/policies/authorize";
import { authorizeChange } from "./authorize-change";
import { draftViewOf, touchedElsewhere } from "./draft-view";
import { reserveLines } from "../records/line-ids";
import { isOpen, wrongStateSentence } from "../records/moves";
import { noteEditor } from "../records/note-editor";
import { proposalById, proposalQuestion, subjectOf, type ProposalRecord } from "../records/proposal-record";
import { sameValue } from "../records/same-value";
import { DraftContent, type DraftEdit, type SaveDraftInput } from "../schema";
import { touchedAfter, type TouchedFields } from "../records/touched-fields";
import { replaceWorkingCopy, storedChange, touchedLines, type StoredChange } from "../records/working-copy";
import type { DraftView } from "../workspace-views";

export type SavedDraft =
  | { outcome: "saved"; lockVersion: number; savedAt: string; touchedElsewhere: DraftView["touchedElsewhere"] }
  /** Somebody else saved since: what is stored now, and nothing of it was overwritten. */
  | { outcome: "moved"; stored: DraftView };

/**
 * Keeps what was typed, complete or not. Saving is no act and leaves no trace in the history; a save that was refused
 * for want of right does.
 */
export async function saveDraft(actor: Actor, input: SaveDraftInput, clock: Clock = systemClock): Promise<SavedDraft> {
  const named = await inSnapshot((tx) => proposalById(input.proposalId, tx));
  try {
    return await inTransaction(async (tx): Promise<SavedDraft> => {
      const at = clock().toISOString();
      const proposal = await proposalById(input.proposalId, tx);
      authorize(actor, proposalQuestion(proposal, actor, "edit"));
      if (!isOpen(proposal.state)) throw new Refusal("wrong_state", wrongStateSentence(proposal.state));
      if (proposal.lockVersion !== input.lockVersion) {
        return { outcome: "moved", stored: await draftViewOf(actor, proposal, at, tx) };
      }

      const stored = await storedChange({ proposalId: proposal.id }, tx);
      const budget = await loadNewestBudget(proposal.productId, tx);
      const typed = whatIsNew(input.content, stored);
      authorizeChange(actor, [actor], { ...budget, productId: proposal.productId }, typed, input.content.edits);
      refuseFaults([...editedTwice(input.content), ...(await reserveLines(proposal, input.content.edits, at, tx))]);

      const touched = touchedBy(actor.userId, at, input.content.edits, {
        stored,
        touched: await touchedLines(proposal.id, tx),
        lines: budget.state.lines,
      });
      await replaceWorkingCopy(proposal, input.content, tx, touched);
      await updateFacts(proposal, input.content, tx);
      await noteEditor(proposal.id, actor.userId, at, tx);
      const elsewhere = await touchedElsewhere(proposal, tx);
      return { outcome: "saved", lockVersion: proposal.lockVersion + 1, savedAt: at, touchedElsewhere: elsewhere };
    });
  } catch (problem) {
    if (!(problem instanceof Refusal)) throw problem;
    const frame = { act: "save_draft", chain: named.productCode, subject: subjectOf(named) } as const;
    return performAct(actor, clock, frame, () => Promise.reject(problem));
  }
}

interface Before {
  stored: StoredChange;
  touched: ReadonlyMap<string, TouchedFields>;
  lines: readonly LineState[];
}

/** Marks what this save changes with its saver, so that each editor sees who changed what. */
function touchedBy(userId: number, at: string, edits: readonly DraftEdit[], before: Before) {
  return new Map(
    edits.map(({ kind, number, body }) => {
      const key = `${kind} ${number}`;
      const isHere = (each: { kind: string; number: string }) => each.kind === kind && each.number === number;
      const stored = before.stored.edits.find(isHere);
      const standing = before.lines.find(isHere);
      const was = stored ? stored.body : standing ? asJson(standing.body) : null;
      const marks = { body: was, touched: before.touched.get(key) ?? {}, isNew: stored === undefined };
      return [key, touchedAfter(marks, body, { userId, at })];
    }),
  );
}

function asJson(body: object): DraftEdit["body"] {
  return DraftContent.shape.edits.element.shape.body.parse(JSON.parse(JSON.stringify(body)));
}

/** Edits and transfers that differ from what is stored: what the saver answers for. */
function whatIsNew({ edits, transfers }: DraftContent, stored: StoredChange): StoredChange {
  return {
    edits: edits.filter((edit) => !stored.edits.some((old) => sameValue(old, edit))),
    transfers: transfers.filter((transfer) => !stored.transfers.some((old) => sameValue(old, transfer))),
  };
}

function editedTwice({ edits }: DraftContent): FieldFault[] {
  return edits.flatMap(({ kind, number, operation, baseLetter }, index) => {
    const first = edits.findIndex((edit) => edit.kind === kind && edit.number === number);
    const path = `edits.${index}.number`;
    if (first < index) return [{ path, sentence: `${number} is edited twice here.` }];
    if ((operation === "add") === (baseLetter === null)) return [];
    return [{ path, sentence: "A new line starts from no revision, any other from one. Reload the page." }];
  });
}

function refuseFaults(faults: readonly FieldFault[]): void {
  const [first] = faults;
  if (first) throw new Refusal("invalid", first.sentence, faults);
}

async function updateFacts(
  proposal: ProposalRecord,
  { title, reason, neededBy }: DraftContent,
  tx: Parameters<typeof proposalById>[1],
): Promise<void> {
  await Proposal.update(
    { title, reason, neededBy, lockVersion: proposal.lockVersion + 1 },
    { where: { id: proposal.id, lockVersion: proposal.lockVersion }, transaction: tx },
  );
}
