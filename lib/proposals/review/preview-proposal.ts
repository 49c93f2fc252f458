import type { ApplyOptions, LineEdit, TransferEdit } from "@/lib/evaluation/budget/edits";
import { previewChange, type PreviewedChange } from "@/lib/evaluation/budget/preview-change";
import type { BudgetResults } from "@/lib/evaluation/budget/results";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { routingFacts } from "@/lib/budget/routing-facts";
import type { ReviewRules } from "@/lib/vocabulary/review-rules";
import type { FieldFault, RefusalCode } from "@/lib/vocabulary/refusal";
import { requiredCapacities, type RequiredCapacity } from "@/policies/approval-routing";
import type { EarlierMove } from "@/policies/routing-facts";
import {
  evidenceFaults,
  justificationFaults,
  justificationNeeds,
  refusedResultFaults,
  type JustificationNeed,
} from "./change-checks";

/** What a proposal asks for: edits, and transfers in their order. */
export interface Change {
  edits: readonly LineEdit[];
  transfers: readonly TransferEdit[];
}

export interface BudgetAtIssue {
  issue: number;
  state: BudgetState;
  results: BudgetResults;
}

export interface RoutingContext {
  rules: ReviewRules;
  earlierMoves: readonly EarlierMove[];
  isSubmittedByManager: boolean;
}

/** Why a change cannot be proposed as it stands, with the code under which it is refused. */
export interface Obstacle extends FieldFault {
  code: Extract<
    RefusalCode,
    "invalid" | "conservation" | "evaluation_refused" | "evidence_missing" | "justification_missing"
  >;
}

export interface ProposalPreview {
  change: PreviewedChange;
  obstacles: Obstacle[];
  justifications: JustificationNeed[];
  routing: RequiredCapacity[];
}

/** What a change does to a budget, what still keeps it from being proposed, and what would have to sign it. */
export function previewProposal(
  budget: BudgetAtIssue,
  { edits, transfers }: Change,
  routing: RoutingContext,
  options: Pick<ApplyOptions, "mayOwn"> = {},
): ProposalPreview {
  const applied = { ...options, issue: budget.issue + 1 };
  const change = previewChange(budget.state, budget.results, edits, transfers, applied);
  const justifications = justificationNeeds(edits, change.after.state, change.after.results);
  return {
    change,
    obstacles: obstaclesOf({ edits, transfers }, change, justifications),
    justifications,
    routing: routingOf(budget, { edits, transfers }, change, routing),
  };
}

function routingOf(
  before: BudgetAtIssue,
  { edits, transfers }: Change,
  { after }: PreviewedChange,
  { rules, earlierMoves, isSubmittedByManager }: RoutingContext,
): RequiredCapacity[] {
  const facts = routingFacts({ rules, edits, transfers: transfers.length, before, after, earlierMoves });
  return requiredCapacities(facts, isSubmittedByManager);
}

function obstaclesOf(change: Change, preview: PreviewedChange, needs: readonly JustificationNeed[]): Obstacle[] {
  const { faults, shortfall, after } = preview;
  const as = (code: Obstacle["code"], found: readonly FieldFault[]) => found.map((fault) => ({ ...fault, code }));
  return [
    ...as("invalid", [...emptyFaults(change), ...faults, ...idleFaults(change, preview)]),
    ...as("conservation", shortfall ? [{ path: "transfers", sentence: shortfall.sentence }] : []),
    ...as("evaluation_refused", refusedResultFaults(change.edits, after.results)),
    ...as("evidence_missing", evidenceFaults(change.edits, after.state)),
    ...as("justification_missing", justificationFaults(needs)),
  ];
}

function emptyFaults({ edits, transfers }: Change): FieldFault[] {
  if (edits.length + transfers.length > 0) return [];
  return [{ path: "edits", sentence: "A proposal changes at least one line or moves an allocation." }];
}

/** An edit that leaves its line as it was would get no revision, and nobody should sign for it. */
function idleFaults({ edits }: Change, { faults, changedLines }: PreviewedChange): FieldFault[] {
  return edits.flatMap(({ kind, number }, index) => {
    const isFaulty = faults.some(({ path }) => path.startsWith(`edits.${index}.`));
    const isChanged = changedLines.some((line) => line.kind === kind && line.number === number);
    if (isFaulty || isChanged) return [];
    return [{ path: `edits.${index}.body`, sentence: `This changes nothing of ${number}: change it or take it out.` }];
  });
}
