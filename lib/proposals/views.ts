import type { PointEffect } from "@/lib/evaluation/budget/effects";
import type { EffectBasis } from "@/lib/evaluation/measures/effect-bases";
import type { EditOperation, LineKind, ProductKind } from "@/lib/vocabulary/lines";
import type { Decision, ProposalState } from "@/lib/vocabulary/proposals";
import type { Capacity } from "@/lib/vocabulary/roles";
import type { ComparedText, JointView, SidesEffect } from "./sheet-views";

export interface PersonView {
  id: number;
  name: string;
}

export interface LineReference {
  kind: LineKind;
  number: string;
  name: string;
}

export interface NoteView {
  code: string;
  severity: "information" | "caution" | "refusal";
  sentence: string;
}

/** One item at one operating point, in newtons; null where the item has no result on that side. */
export interface ItemEffectView {
  item: string;
  name: string;
  operatingPoint: string;
  predictedWas: number | null;
  predictedNow: number | null;
  delta: number;
  notesNew: NoteView[];
  notesVanished: NoteView[];
}

export interface EffectView {
  /** The issue on which the change was computed. */
  onIssue: number;
  /** Worst operating point first. */
  points: PointEffect[];
  edited: ItemEffectView[];
  /** Items nobody edited that move all the same. */
  followers: ItemEffectView[];
  /** To what the forces of each operating point are referred, on both sides. */
  bases: EffectBasis[];
  /** What reaches several items at once: a finish, a version of a method. */
  touches: TouchView[];
  /** "Predicted falls by 3.90 N; inside again." */
  sentence: string;
}

/** A finish or a version of a method that changes, with every item that it reaches: also those that stay. */
export interface TouchView {
  title: string;
  sentence: string;
  effects: ItemEffectView[];
}

export interface FieldChangeRow {
  field: string;
  label: string;
  /** null where the field does not stand on that side. */
  was: string | null;
  toBe: string | null;
  unit: string | null;
  changed: boolean;
  /** Newtons at the worst operating point, applied in the order shown so that they sum to the line's. */
  effect: SidesEffect;
  /** A long text that changed, line by line; null for anything else. */
  compared: ComparedText | null;
  remarkNumbers: number[];
}

export interface LineChangeView extends LineReference {
  operation: EditOperation;
  baseLetter: string | null;
  /** Letter today; differs from the base letter when the line moved since. */
  todayLetter: string | null;
  nextLetter: string;
  rows: FieldChangeRow[];
  effect: SidesEffect;
}

export interface HolderView {
  kind: "item" | "group" | "unallocated";
  number: string | null;
  name: string;
}

export interface TransferView {
  giver: HolderView;
  receiver: HolderView;
  hundredths: number;
}

export interface SignatureView {
  id: number;
  round: number;
  capacity: Capacity;
  decision: Decision;
  meaning: string | null;
  reason: string | null;
  signer: PersonView;
  printedName: string;
  deputyFor: PersonView | null;
  at: string;
  hash: string;
  counts: boolean;
  /** Why it does not count: "belongs to round 1", "taken back". */
  becauseNot: string | null;
}

export interface CapacityView {
  capacity: Capacity;
  required: boolean;
  reasons: string[];
  filledBy: SignatureView | null;
  /** Who may sign it now; empty and `missing` says which role is missing. */
  maySign: PersonView[];
  named: PersonView | null;
  /** Whom a program manager could name for it: who is free to sign in their own right. */
  couldName: PersonView[];
  missing: string | null;
}

export interface RoutingView {
  capacities: CapacityView[];
  /** Persons who may not sign, each with why. */
  barred: { person: PersonView; because: string }[];
}

export interface ReplyView {
  id: number;
  author: PersonView;
  at: string;
  text: string;
  suggestion: string | null;
  to: PersonView[];
}

export interface RemarkView extends ReplyView {
  /** "R1": counted within the proposal. */
  number: number;
  round: number;
  line: LineReference | null;
  field: string | null;
  fieldLabel: string | null;
  /** What the field said in the round of the remark, where the round shown says something else or no longer has it. */
  referredTo: string | null;
  asksForAction: boolean;
  settled: { by: PersonView; at: string; reason: string } | null;
  replies: ReplyView[];
  maySettle: boolean;
}

export interface ObjectionView {
  id: number;
  by: PersonView;
  at: string;
  round: number;
  reason: string;
}

/** `applies` false: do not show it. Not `allowed`: show the sentence instead of the button. */
export interface MoveView {
  applies: boolean;
  allowed: boolean;
  because: string | null;
}

export type ProposalMove =
  | "edit"
  | "share"
  | "propose"
  | "withdraw"
  | "carry_forward"
  | "sign_as_reviewer"
  | "sign_as_program_manager"
  | "return"
  | "disapprove"
  | "take_back"
  | "object"
  | "remark"
  | "add_file"
  | "name_reviewer";

export interface ProductView {
  id: number;
  code: string;
  name: string;
  kind: ProductKind;
}

export interface RoundView {
  round: number;
  baseIssue: number;
  submittedAt: string;
  submittedBy: PersonView;
  hash: string;
}

/** A file as it is shown: to be downloaded, and what is known of it. */
export interface FileView {
  fileId: number;
  name: string;
  mediaType: string;
  size: number;
  sha256: string;
  sourceDate: string;
  addedBy: string;
  addedAt: string;
  voided: { by: string; at: string; reason: string } | null;
  mayVoid: boolean;
}

/** One citation of an edited item, with its file where it has one. */
export interface CitedEvidenceView {
  line: LineReference;
  document: string;
  revision: string;
  date: string;
  /** Not cited by the revision that the edit starts from. */
  isNew: boolean;
  fileName: string | null;
  /** null where it has none, or where it is not (or not yet) the reader's to open. */
  file: FileView | null;
}

export interface EvidenceView {
  cited: CitedEvidenceView[];
  /** Added beside the proposal since it was submitted; no hash of a round covers them. */
  beside: FileView[];
  /** Days after which evidence counts as old, by today's terms. */
  ageDays: number;
  /** What who may sign, or did, opened of this round; the files counted once each. */
  signers: SignerLookings[];
  /** Edited lines that have a history to look at. */
  histories: LineReference[];
}

export interface SignerLookings {
  person: PersonView;
  files: { fileId: number; name: string; at: string | null }[];
  /** Only for those who watch over the review; null for others. */
  histories: { line: LineReference; at: string | null }[] | null;
}

/** What is signed, exactly as it is kept. */
export interface SigningSheetView {
  text: string;
  textHash: string;
  roundHash: string;
}

export interface ProposalView {
  product: ProductView;
  proposalId: number;
  key: string;
  label: string;
  number: number | null;
  title: string;
  reason: string;
  neededBy: string | null;
  state: ProposalState;
  lockVersion: number;
  proposer: PersonView;
  coEditors: PersonView[];
  newestIssue: number;
  round: RoundView | null;
  rounds: RoundView[];
  /** Issue that the last signature made. */
  approvedAsIssue: number | null;
  lines: LineChangeView[];
  transfers: TransferView[];
  evidence: EvidenceView;
  /** null where the content cannot be computed; `faults` says why. */
  effectOnBase: EffectView | null;
  effectToday: EffectView | null;
  /** null where nothing else is proposed, or where it is decided; the number of others where they are too many. */
  jointly: JointView | number | null;
  comparedReason: ComparedText | null;
  faults: { path: string; sentence: string }[];
  /** Why today's issue could not take it: "010 would have to give 0.40 N more than it holds." */
  blocked: string | null;
  overtaken: string[];
  /** Files that it cites and that were voided, a sentence each. */
  voidedEvidence: string[];
  routing: RoutingView | null;
  /** Why the named reviewer took the place of another; null where nobody was replaced. */
  namedBecause: string | null;
  signatures: SignatureView[];
  objections: ObjectionView[];
  remarks: RemarkView[];
  addressable: PersonView[];
  moves: Record<ProposalMove, MoveView>;
  /** For whom the reader may sign as a deputy, by capacity. */
  deputyFor: { capacity: Capacity; person: PersonView }[];
  signingSheet: SigningSheetView | null;
}
