import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { previewChange } from "@/lib/evaluation/budget/preview-change";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import { firstIssueLines } from "@/lib/products/first-issue";
import type { BudgetAtIssue } from "@/lib/proposals/review/preview-proposal";
import type { DraftContent } from "@/lib/proposals/schema";
import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import type { Capacity } from "@/lib/vocabulary/roles";
import type { RequiredCapacity } from "@/policies/approval-routing";
import type { EarlierMove } from "@/policies/routing-facts";
import type { Member } from "@/policies/signing-rights";
import { firstPoint } from "@/tests/support/budget-on-file";
import type { Picture } from "./desk";
import { firstChange, LIMIT, RESERVE } from "./first-issues";
import type { ModelState } from "./model-state";

export const PRODUCT = 1;
export const DAY_MS = 86_400_000;
export interface Round {
  content: DraftContent;
  base: number;
  submitterId: number;
  isSubmittedByManager: boolean;
  required: RequiredCapacity[];
  approvals: { signerId: number; capacity: Capacity }[];
}

export interface Proposal {
  state: ModelState;
  proposerId: number;
  coEditorIds: number[];
  editorIds: number[];
  signerIds: number[];
  base: number;
  copy: DraftContent;
  rounds: number;
  round: Round | null;
  requests: { authorId: number; settled: boolean }[];
}

export interface Approved extends Omit<EarlierMove, "released"> {
  released: number;
  at: number;
}

export interface Memory {
  issues: BudgetAtIssue[];
  proposals: Proposal[];
  moves: Approved[];
  members: Member[];
  actors: Actor[];
  now: number;
}

export function firstIssues(ids: Record<string, number>): BudgetAtIssue[] {
  const lines = firstIssueLines("vehicle_fairing", {
    productCode: "TF-2",
    operatingPoint: { number: "OP-1", body: firstPoint(LIMIT) },
    terms: newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: RESERVE }),
    password: "not asked",
  });
  const empty: BudgetState = { product: { code: "TF-2", name: "Fairing", kind: "vehicle_fairing" }, lines };
  const { edits, transfers } = firstChange(ids);
  const results = evaluateBudget(empty);
  const { after, faults, shortfall } = previewChange(empty, results, edits, transfers);
  if (faults.length > 0 || shortfall) throw new Error("the walk does not begin on a sound budget");
  return [
    { issue: 1, state: empty, results },
    { issue: 2, ...after },
  ];
}

export function nobody(): never {
  throw new Error("there is no such person or proposal");
}

export function refuse(code: Refusal["code"]): never {
  throw new Refusal(code, code);
}

export function newest({ issues }: Memory): BudgetAtIssue {
  return issues.at(-1) ?? nobody();
}

export function issueAt({ issues }: Memory, issue: number): BudgetAtIssue {
  return issues[issue - 1] ?? nobody();
}

export function picture(desk: Memory, names: Record<number, string>): Picture {
  const { lines } = newest(desk).state;
  const issues = desk.issues.map(({ state }) => state.lines);
  const revisions = (number: string) => {
    const letters = issues.flatMap((each) => each.find((line) => line.kind === "item" && line.number === number) ?? []);
    return new Set(letters.map(({ letter }) => letter)).size - 1;
  };
  const shown: Picture = {
    ...{ issues: desk.issues.length, limit: 0, reserve: 0, rows: {}, unallocated: 0, items: {} },
    proposals: desk.proposals.map(({ state, rounds }) => ({ state, rounds })),
  };
  for (const line of lines) {
    if (line.kind === "operating_point") shown.limit = line.body.limitHundredths ?? 0;
    if (line.kind === "terms") shown.reserve = line.body.reserves[0]?.hundredths ?? 0;
    if (line.kind === "allocations") {
      shown.rows = Object.fromEntries(line.body.rows.map((row) => [`${row.kind} ${row.number}`, row.hundredths]));
      shown.unallocated = line.body.unallocatedHundredths;
    }
    if (line.kind !== "item" || line.body.method !== "fixed") continue;
    const { ownerId, force, group } = line.body;
    const item = { owner: names[ownerId] ?? "", force: Math.round(force.value * 100), group, retired: line.retired };
    shown.items[line.number] = { ...item, revision: revisions(line.number) };
  }
  return shown;
}
