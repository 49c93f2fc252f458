import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { nameBookOf } from "@/lib/evaluation/lines/name-book";
import { LINE_KIND_NAMES } from "@/lib/vocabulary/lines";
import type { ReviewRules } from "@/lib/vocabulary/review-rules";
import { overtakenReasons } from "./overtaken";
import { previewProposal, type BudgetAtIssue, type Obstacle } from "./preview-proposal";
import { DraftEdit, type DraftTransfer } from "../schema";
import { carriedEdits, settledEdit, settlementRow, type CarriedEdit } from "./settlement";

/** One proposal of a set that is thought of as approved. */
export interface JointProposal {
  key: string;
  label: string;
  /** The issue that it was drafted on. */
  base: BudgetAtIssue;
  rules: ReviewRules;
  edits: readonly DraftEdit[];
  transfers: readonly DraftTransfer[];
}

/** What becomes of one proposal when those ahead of it are approved. */
export interface JointStep {
  key: string;
  label: string;
  /** The issue that its approval would make; null where it could not be approved and so does not count. */
  issue: number | null;
  /** Why it cannot be approved after those ahead of it, a sentence each. */
  conflicts: string[];
  /** Why it would have to be carried forward first; nothing of it has to be settled. */
  carried: string[];
  /** What its proposer still has to say before it can be submitted: evidence, justifications. */
  missing: string[];
}

export interface JointChange {
  steps: JointStep[];
  after: BudgetAtIssue;
}

/** They ask the proposer for words; no number of the result depends on them. */
const ASKS_FOR_WORDS: readonly Obstacle["code"][] = ["evidence_missing", "justification_missing"];

/**
 * Approves a set of proposals one after another in their order, in memory. What an earlier one overtakes is carried
 * forward where every field carries by itself, and left out where a person would have to settle something.
 */
export function jointChange(
  today: BudgetAtIssue,
  proposals: readonly JointProposal[],
  people: ReadonlyMap<number, string>,
): JointChange {
  let after = today;
  const steps: JointStep[] = [];
  for (const proposal of proposals) {
    const made = stepOnto(after, proposal, { steps, people });
    steps.push(made.step);
    after = made.after;
  }
  return { steps, after };
}

interface Earlier {
  steps: readonly JointStep[];
  people: ReadonlyMap<number, string>;
}

function stepOnto(onto: BudgetAtIssue, proposal: JointProposal, earlier: Earlier) {
  const { key, label, base, rules, transfers } = proposal;
  const overtaken = overtakenReasons(base.state, onto.state, proposal.edits);
  const settled = overtaken.length > 0 ? carry(onto, proposal, earlier) : { edits: proposal.edits, conflicts: [] };
  const context = { rules, earlierMoves: [], isSubmittedByManager: false };
  const { change, obstacles } = previewProposal(onto, { edits: settled.edits, transfers }, context);
  const blocking = obstacles.filter(({ code }) => !ASKS_FOR_WORDS.includes(code));
  const conflicts = settled.conflicts.length > 0 ? settled.conflicts : sentencesOf(blocking);
  const counts = conflicts.length === 0;
  const issue = onto.issue + 1;
  const step: JointStep = {
    ...{ key, label, conflicts, issue: counts ? issue : null },
    carried: counts ? overtaken.map((reason) => withMakers(reason, earlier)) : [],
    missing: counts ? sentencesOf(obstacles) : [],
  };
  return { step, after: counts ? { issue, ...change.after } : onto };
}

/** The edits on the newer issue, and what a person would have to settle before they could stand there. */
function carry(onto: BudgetAtIssue, { base, edits, label }: JointProposal, earlier: Earlier) {
  const carried = carriedEdits(base.state, onto.state, edits);
  const conflicts = carried.flatMap((each) => [
    ...(each.obstacle === null ? [] : [withMakers(each.obstacle, earlier)]),
    ...bothChanged(each, label, { base: base.state, onto: onto.state }, earlier),
  ]);
  return { edits: carried.map((each) => DraftEdit.parse(settledEdit(each, new Map()))), conflicts };
}

function bothChanged(
  carried: CarriedEdit,
  label: string,
  states: { base: BudgetState; onto: BudgetState },
  { steps, people }: Earlier,
): string[] {
  const { edit, merges, onto } = carried;
  const names = { base: nameBookOf(states.base, people), onto: nameBookOf(states.onto, people) };
  const maker = onto === null ? undefined : steps.find(({ issue }) => issue === onto.issue)?.label;
  const other = maker ?? `issue ${onto?.issue ?? ""}`;
  return merges
    .filter(({ side }) => side === "conflict")
    .map((merge) => {
      const row = settlementRow(carried, merge, names);
      const line = `${LINE_KIND_NAMES[edit.kind].toLowerCase()} ${edit.number}`;
      const values = `${row.theirs ?? "empty"} there, ${row.yours ?? "empty"} here`;
      return `${other} and ${label} both change “${row.label}” of ${line}: ${values}.`;
    });
}

/** An issue that only this set would make is told by the proposal that would make it. */
function withMakers(sentence: string, { steps }: Earlier): string {
  return sentence.replaceAll(/\bissue (\d+)/g, (words, number: string) => {
    const maker = steps.find(({ issue }) => issue === Number(number));
    return maker ? `${words} (${maker.label})` : words;
  });
}

function sentencesOf(obstacles: readonly Obstacle[]): string[] {
  return [...new Set(obstacles.map(({ sentence }) => sentence))];
}
