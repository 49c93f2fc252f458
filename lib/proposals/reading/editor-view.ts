import type { Transaction } from "sequelize";
import { approvedMoves } from "@/lib/budget/approved-moves";
import { productByCode, type LoadedBudget } from "@/lib/budget/load-budget";
import { membersAt, namesOf } from "@/lib/budget/members";
import { termsOf } from "@/lib/evaluation/budget/indexed-state";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { Refusal } from "@/lib/vocabulary/refusal";
import { inSnapshot } from "@/models/database";
import { authorize } from "@/policies/authorize";
import { budgetReader } from "../records/budget-reader";
import { draftViewOf } from "../drafting/draft-view";
import { heldFiles } from "./file-views";
import { isOpen, wrongStateSentence } from "../records/moves";
import type { BudgetAtIssue, RoutingContext } from "../review/preview-proposal";
import { overtakenReasons } from "../review/overtaken";
import { proposalByKey, proposalQuestion, type ProposalRecord } from "../records/proposal-record";
import type { FileView, PersonView } from "../views";
import { storedChange } from "../records/working-copy";
import type { DraftView } from "../workspace-views";

/** All that the editor of a proposal computes with, so that it previews what the server will decide. */
export interface EditorView {
  draft: DraftView;
  /** Today's budget, on which it would be submitted; the one it stands on where it was overtaken since. */
  budget: BudgetAtIssue;
  people: PersonView[];
  /** Persons who may own an item here. */
  owners: PersonView[];
  /** Files that a citation can name without a second upload. */
  files: FileView[];
  routing: RoutingContext;
  me: { userId: number; isProgramManager: boolean };
}

/** @throws Refusal where there is no such proposal, the reader may not edit it, or it is closed */
export function editorView(
  actor: Actor,
  productCode: string,
  key: string,
  clock: Clock = systemClock,
): Promise<EditorView> {
  return inSnapshot(async (tx) => {
    const at = clock().toISOString();
    const product = await productByCode(productCode, tx);
    const proposal = await proposalByKey(product.id, key, tx);
    if (!proposal) throw new Refusal("not_found", "There is no such proposal.");
    authorize(actor, proposalQuestion(proposal, actor, "edit"));
    if (!isOpen(proposal.state)) throw new Refusal("wrong_state", wrongStateSentence(proposal.state));

    const { issue, state, results } = await budgetToEditOn(proposal, tx);
    const rules = termsOf(state).reviewRules;
    const members = await membersAt(proposal.productId, at, tx);
    const mine = members.find(({ userId }) => userId === actor.userId)?.roles ?? [];
    const isProgramManager = mine.includes("program_manager");
    return {
      draft: await draftViewOf(actor, proposal, at, tx),
      budget: { issue, state, results },
      people: await namesOf(proposal.productId, tx),
      owners: members
        .filter(({ roles }) => roles.includes("component_owner"))
        .map(({ userId, printedName }) => ({ id: userId, name: printedName })),
      files: await heldFiles(actor, proposal.productId, tx),
      routing: {
        rules,
        earlierMoves: await approvedMoves(proposal.productId, at, rules.programManagerOn.windowDays, tx),
        isSubmittedByManager: isProgramManager,
      },
      me: { userId: actor.userId, isProgramManager },
    };
  });
}

async function budgetToEditOn(proposal: ProposalRecord, tx: Transaction): Promise<LoadedBudget> {
  const budgets = budgetReader(proposal.productId, tx);
  const [base, newest] = [await budgets.at(proposal.baseIssue), await budgets.newest()];
  const { edits } = await storedChange({ proposalId: proposal.id }, tx);
  return overtakenReasons(base.state, newest.state, edits).length === 0 ? newest : base;
}
