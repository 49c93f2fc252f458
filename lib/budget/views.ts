import type { AllocationsView } from "@/lib/evaluation/budget/allocations-view";
import type { BudgetResults } from "@/lib/evaluation/budget/results";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import type { MeasureBasis } from "@/lib/evaluation/measures/measure-basis";
import type { LineKind, ProductKind } from "@/lib/vocabulary/lines";
import type { Capacity, Role } from "@/lib/vocabulary/roles";
import type { Standing } from "@/lib/vocabulary/standing";
import type { StoredUncertainty } from "./stored-uncertainty";

export interface PersonName {
  id: number;
  name: string;
}

export interface ProductFacts {
  id: number;
  code: string;
  name: string;
  kind: ProductKind;
  timeZone: string;
  /** null until a program manager has established it. */
  newestIssue: number | null;
}

/** A signature that counted for an issue: for the first one the establishing signature. */
export interface IssueSignature {
  capacity: Capacity;
  printedName: string;
  deputyFor: string | null;
  at: string;
}

export interface IssueFacts {
  number: number;
  at: string;
  contentHash: string;
  /** null for issue 1, the establishing act. */
  proposal: { number: number; label: string; title: string; proposer: PersonName } | null;
  signatures: IssueSignature[];
  baselines: { name: string; purpose: string; signedBy: string; at: string }[];
}

/** A budget as it stood at one issue: lines and results read from the issues alone, nothing computed anew. */
export interface BudgetAt {
  product: ProductFacts;
  issue: IssueFacts;
  state: BudgetState;
  results: BudgetResults;
  /** To first order, as the issue froze it; null where it keeps nothing of it. */
  uncertainty: StoredUncertainty | null;
  /** At the reference operating point of this issue. */
  allocations: AllocationsView;
  people: PersonName[];
}

/** Newtons at one operating point of one issue. */
export interface TrendPoint {
  operatingPoint: string;
  name: string;
  basic: number;
  growth: number;
  predicted: number;
  limit: number;
  reserve: number;
  margin: number;
  standing: Standing;
  /** What these forces are referred to, by the terms of their own issue. */
  basis: MeasureBasis;
}

export interface TrendIssue {
  number: number;
  at: string;
  proposal: IssueFacts["proposal"];
  points: TrendPoint[];
}

/** One field of a line on two sides; null where the line does not have it there. */
export interface ComparedField {
  field: string;
  label: string;
  was: string | null;
  now: string | null;
  unit: string | null;
}

export interface ComparedLine {
  kind: LineKind;
  number: string;
  name: string;
  /** null where the line did not yet exist. */
  letterWas: string | null;
  /** null where it does not exist yet, which is so only on the way back. */
  letterNow: string | null;
  retiredWas: boolean;
  retiredNow: boolean;
  /** Only the fields that differ. */
  fields: ComparedField[];
}

export interface IssueComparison {
  from: IssueFacts;
  to: IssueFacts;
  lines: ComparedLine[];
  /** Items whose predicted value differs at an operating point that both issues have. */
  items: {
    item: string;
    name: string;
    operatingPoint: string;
    predictedWas: number | null;
    predictedNow: number | null;
  }[];
  points: { operatingPoint: string; name: string; predictedWas: number | null; predictedNow: number | null }[];
}

/** One revision of a line and what brought it. */
export interface LineRevisionView {
  letter: string;
  retired: boolean;
  issue: IssueFacts;
  /** What differs from the revision before; all fields at the first. */
  fields: ComparedField[];
}

export interface RegisterEntry {
  product: ProductFacts;
  /** Roles that the reader holds there; empty for an administrator. */
  roles: Role[];
  /** null until it is established, and for those who may not read the budget. */
  worst: {
    operatingPoint: string;
    name: string;
    predicted: number;
    limit: number;
    reserve: number;
    margin: number;
    standing: Standing;
  } | null;
  openProposals: number;
}
