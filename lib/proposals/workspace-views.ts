import type { LineKind } from "@/lib/vocabulary/lines";
import type { ProposalState } from "@/lib/vocabulary/proposals";
import type { Capacity } from "@/lib/vocabulary/roles";
import type { Standing } from "@/lib/vocabulary/standing";
import type { DraftContent } from "./schema";
import type { LineReference, PersonView } from "./views";

/** What a change does to the margin to the limit, in newtons at the operating point that stands worst with it. */
export interface MarginEffect {
  operatingPoint: string;
  predictedDelta: number;
  /** Margin on today's issue, before the change. */
  marginWas: number;
}

/** The working copy as its editors see it. */
export interface DraftView {
  proposalId: number;
  key: string;
  label: string;
  productCode: string;
  state: ProposalState;
  lockVersion: number;
  savedAt: string;
  savedBy: PersonView;
  /** Issue on which the working copy stands. */
  baseIssue: number;
  newestIssue: number;
  content: DraftContent;
  proposer: PersonView;
  coEditors: PersonView[];
  /** Members of the product whom one could name as co-editors. */
  couldCoEdit: PersonView[];
  /** Who changed a field last; of "item 030" as the line is keyed, field "" says who put the line in. */
  touched: { line: string; field: string; by: PersonView; at: string }[];
  /** Lines of this draft that drafts or open proposals of others touch too; whose a draft is stays untold. */
  touchedElsewhere: { line: LineReference; by: PersonView | null; state: ProposalState; number: number | null }[];
  /** Warned before the first keystroke: editing bars from signing. */
  warning: string | null;
}

/** One field that both sides changed since the base issue. */
export interface SettlementRow {
  kind: LineKind;
  number: string;
  lineName: string;
  field: string;
  label: string;
  base: string | null;
  theirs: string | null;
  yours: string | null;
}

export interface SettlementView {
  proposalId: number;
  lockVersion: number;
  baseIssue: number;
  ontoIssue: number;
  conflicts: SettlementRow[];
  /** Fields that carry by themselves, with whose value. */
  carried: (SettlementRow & { side: "theirs" | "yours" })[];
  /** Why it cannot be carried at all, for example a line that was retired. */
  obstacles: string[];
  /** Effect on the newest issue as it would be without conflicts. */
  predictedDelta: { operatingPoint: string; delta: number; standingNow: Standing }[];
}

export interface ProposalListRow {
  proposalId: number;
  /** As in the URL: the number, or "draft-17" before it has one. */
  key: string;
  /** "TF2-CP-04", or "Draft 17". */
  label: string;
  number: number | null;
  title: string;
  state: ProposalState;
  round: number;
  proposer: PersonView;
  proposedAt: string | null;
  decidedAt: string | null;
  neededBy: string | null;
  baseIssue: number;
  lines: LineReference[];
  /** Change of the predicted total at the worst point on today's issue, for what is open. */
  effect: { operatingPoint: string; predictedDelta: number; standingWas: Standing; standingNow: Standing } | null;
  waitingFor: { capacity: Capacity; names: string[] }[];
  /** Sentences; empty when it is not overtaken. */
  overtaken: string[];
  unsettledRequests: number;
}

export interface DaySheetEntry {
  productCode: string;
  proposalId: number;
  key: string;
  label: string;
  title: string;
  /** "Sign as reviewer", "Answer remark R2", "Carry forward to issue 14". */
  what: string;
  /** An approval that the reader may give now. */
  isSignature: boolean;
  since: string;
  neededBy: string | null;
  /** What it does to today's margin; null of what has not been submitted. */
  margin: MarginEffect | null;
}

export interface DaySheetItem {
  productCode: string;
  number: string;
  name: string;
  letter: string;
  operatingPoint: string;
  predicted: number | null;
  allocationHundredths: number | null;
  over: boolean;
  cautions: number;
  /** What became of it since the last visit; null where nothing moved. Without a letter then: it is new. */
  since: { letterWas: string | null; predictedDelta: number | null; allocationDelta: number | null } | null;
}

export interface DaySheetView {
  waitsForMe: DaySheetEntry[];
  iWaitFor: (DaySheetEntry & { waitingFor: { capacity: Capacity; names: string[] }[] })[];
  myItems: DaySheetItem[];
  changedSince: { productCode: string; issue: number; at: string; label: string; title: string; key: string }[];
  lastSeenAt: string | null;
}
