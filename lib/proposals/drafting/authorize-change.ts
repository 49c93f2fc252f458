import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import type { Actor } from "@/lib/vocabulary/actor";
import { authorize, isAllowed } from "@/policies/authorize";
import type { Question } from "@/policies/questions";
import type { Member } from "@/policies/signing-rights";
import type { DraftEdit, DraftTransfer } from "../schema";

/**
 * Demands for every edit and transfer that one of its editors may ask for it; the sentence of a refusal is the
 * actor's. With the actor alone as editor this is the check of what they just typed.
 */
export function authorizeChange(
  actor: Actor,
  editors: readonly Actor[],
  budget: { productId: number; state: BudgetState },
  { edits, transfers }: { edits: readonly DraftEdit[]; transfers: readonly DraftTransfer[] },
  allEdits: readonly DraftEdit[] = edits,
): void {
  const questions: Question[] = [
    ...edits.map((edit) => lineQuestion(edit, budget)),
    ...transfers.map((transfer) => transferQuestion(transfer, budget, allEdits)),
  ];
  for (const question of questions) {
    if (!editors.some((editor) => isAllowed(editor, question))) authorize(actor, question);
  }
}

/** Members as actors of this product alone, to ask the policy about them. */
export function actorsOf(productId: number, members: readonly Member[]): Actor[] {
  return members.map(({ userId, printedName, roles }) => ({
    userId,
    printedName,
    isAdministrator: false,
    memberships: roles.map((role) => ({ productId, role })),
  }));
}

function lineQuestion(
  { operation, kind, number, body }: DraftEdit,
  { productId, state }: { productId: number; state: BudgetState },
): Question {
  const ownerBefore = ownerOf(state, number);
  const ownerAfter = typeof body?.ownerId === "number" ? body.ownerId : ownerBefore;
  return {
    on: "Line",
    action: operation,
    productId,
    kind,
    ownerBefore: kind === "item" ? ownerBefore : null,
    ownerAfter: kind === "item" ? ownerAfter : null,
  };
}

function transferQuestion(
  { giver, receiver }: DraftTransfer,
  { productId, state }: { productId: number; state: BudgetState },
  edits: readonly DraftEdit[],
): Question {
  const owner = ({ kind, number }: DraftTransfer["giver"]) => {
    if (kind !== "item" || number === null) return null;
    const added = edits.find((edit) => edit.kind === "item" && edit.number === number)?.body?.ownerId;
    return ownerOf(state, number) ?? (typeof added === "number" ? added : null);
  };
  return { on: "Transfer", action: "ask", productId, giverOwner: owner(giver), receiverOwner: owner(receiver) };
}

function ownerOf(state: BudgetState, item: string): number | null {
  const line = state.lines.find(({ kind, number }) => kind === "item" && number === item);
  return line?.kind === "item" ? line.body.ownerId : null;
}
