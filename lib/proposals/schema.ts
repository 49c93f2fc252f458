import { z } from "zod";
import { EDIT_OPERATIONS, LINE_KINDS } from "@/lib/vocabulary/lines";
import { CAPACITIES } from "@/lib/vocabulary/roles";
import { fileName, markdownText, plainText, sentenceText } from "./texts";

export const MAX_EDITS = 200;
const MAX_TRANSFERS = 100;

const LineNumber = z
  .string()
  .trim()
  .regex(/^[A-Z0-9][A-Z0-9-]{0,11}$/, "Use capital letters, digits and hyphens, at most 12, for example 010.");

const ProductCode = z.string().regex(/^[A-Z0-9][A-Z0-9-]{1,11}$/, "This is no product code.");

/** One render of a form has one key: sent twice, it acts once. */
export const IdempotencyKey = z.string().regex(/^[A-Za-z0-9_-]{8,80}$/, "Reload the page and try again.");

const Hash = z.string().regex(/^[0-9a-f]{64}$/, "Reload the page and try again.");
const Password = z.string().min(1, "Type your password.").max(200, "This is too long for a password.");
const Id = z.int().positive();

/** An edit as it stands in the working copy: the body may still be incomplete. */
export const DraftEdit = z.strictObject({
  operation: z.enum(EDIT_OPERATIONS),
  kind: z.enum(LINE_KINDS),
  number: LineNumber,
  /** Letter of the revision that the edit starts from; null for a new line. */
  baseLetter: z.string().max(4).nullable(),
  body: z.record(z.string(), z.json()).nullable(),
});
export type DraftEdit = z.infer<typeof DraftEdit>;

const TransferHolder = z
  .strictObject({ kind: z.enum(["item", "group", "unallocated"]), number: LineNumber.nullable() })
  .refine((holder) => (holder.kind === "unallocated") === (holder.number === null), "Name an item or a group.");

export const DraftTransfer = z.strictObject({
  giver: TransferHolder,
  receiver: TransferHolder,
  hundredths: z
    .int("State newtons with at most two decimals.")
    .min(1, "A transfer moves at least 0.01 N.")
    .max(1e12, "This is more than any budget holds."),
});
export type DraftTransfer = z.infer<typeof DraftTransfer>;

/** What a form of the editor holds. Saved as typed; only submitting demands that it is complete. */
export const DraftContent = z.strictObject({
  title: plainText(120),
  reason: markdownText(),
  neededBy: z.iso.date("State the day as 2026-05-31.").nullable(),
  edits: z.array(DraftEdit).max(MAX_EDITS, `One proposal holds at most ${MAX_EDITS} lines.`),
  transfers: z.array(DraftTransfer).max(MAX_TRANSFERS, `One proposal holds at most ${MAX_TRANSFERS} transfers.`),
});
export type DraftContent = z.infer<typeof DraftContent>;

export const StartDraftInput = z.strictObject({
  productCode: ProductCode,
  title: plainText(120),
  key: IdempotencyKey,
});
export type StartDraftInput = z.infer<typeof StartDraftInput>;

export const SaveDraftInput = z.strictObject({ proposalId: Id, lockVersion: z.int().min(0), content: DraftContent });
export type SaveDraftInput = z.infer<typeof SaveDraftInput>;

export const ShareDraftInput = z.strictObject({ proposalId: Id, userId: Id });
export type ShareDraftInput = z.infer<typeof ShareDraftInput>;

export const ProposeInput = z.strictObject({
  proposalId: Id,
  lockVersion: z.int().min(0),
  key: IdempotencyKey,
  /** Only a program manager who signs by submitting (transfers and regrouping alone) types it. */
  password: Password.nullable(),
});
export type ProposeInput = z.infer<typeof ProposeInput>;

export const WithdrawProposalInput = z.strictObject({
  proposalId: Id,
  reason: sentenceText(500, "Say in a sentence why you withdraw it."),
});
export type WithdrawProposalInput = z.infer<typeof WithdrawProposalInput>;

export const AddRemarkInput = z
  .strictObject({
    proposalId: Id,
    /** The remark that this one answers; null for a new remark. */
    parentId: Id.nullable(),
    line: z.strictObject({ kind: z.enum(LINE_KINDS), number: LineNumber }).nullable(),
    field: z.string().max(80).nullable(),
    text: markdownText("Write the remark."),
    /** A wording that the remark suggests for the field or the reason. */
    suggestion: plainText(500).nullable(),
    asksForAction: z.boolean(),
    /** Members to whom it is addressed: they get it by mail. */
    to: z.array(Id).max(20, "Address it to at most 20 people.").default([]),
    key: IdempotencyKey,
  })
  .refine((remark) => remark.field === null || remark.line !== null, { path: ["field"], error: "Name the line." });
export type AddRemarkInput = z.infer<typeof AddRemarkInput>;

export const SettleRemarkInput = z.strictObject({
  remarkId: Id,
  reason: sentenceText(500, "Say in a sentence how it was settled."),
});
export type SettleRemarkInput = z.infer<typeof SettleRemarkInput>;

/** Exactly what the signer had before them: the round, and the text with its effect on today's issue. */
const SheetShown = { proposalId: Id, roundHash: Hash, textHash: Hash };

const ApprovalOfSheet = z.strictObject({
  ...SheetShown,
  decision: z.literal("approve"),
  capacity: z.enum(CAPACITIES),
  meaning: plainText(200, "Choose what your signature means."),
  /** The person for whom a deputy signs; null in one's own right. */
  deputyForId: Id.nullable(),
});

export const SignProposalInput = z.discriminatedUnion("decision", [
  ApprovalOfSheet.extend({ password: Password }),
  z.strictObject({
    ...SheetShown,
    decision: z.literal("disapprove"),
    capacity: z.literal("program_manager"),
    reason: sentenceText(2000, "Say in a sentence why you disapprove it."),
    deputyForId: Id.nullable(),
    password: Password,
  }),
]);
export type SignProposalInput = z.infer<typeof SignProposalInput>;

/** Several sheets that were each opened, approved under one password. */
export const SignSheetsInput = z.strictObject({
  sheets: z.array(ApprovalOfSheet).min(1, "Choose a sheet.").max(20, "Sign at most 20 sheets at once."),
  password: Password,
});
export type SignSheetsInput = z.infer<typeof SignSheetsInput>;

export const ReturnProposalInput = z.strictObject({
  proposalId: Id,
  roundHash: Hash,
  capacity: z.enum(CAPACITIES),
  deputyForId: Id.nullable().default(null),
  reason: sentenceText(2000, "Say in a sentence what has to be done before it can be approved."),
});
export type ReturnProposalInput = z.infer<typeof ReturnProposalInput>;

export const TakeBackApprovalInput = z.strictObject({
  proposalId: Id,
  reason: sentenceText(500, "Say in a sentence why you take your approval back."),
});
export type TakeBackApprovalInput = z.infer<typeof TakeBackApprovalInput>;

export const RaiseObjectionInput = z.strictObject({
  proposalId: Id,
  reason: sentenceText(2000, "Say in a sentence why you object."),
  key: IdempotencyKey,
});
export type RaiseObjectionInput = z.infer<typeof RaiseObjectionInput>;

export const NameReviewerInput = z.strictObject({
  proposalId: Id,
  userId: Id.nullable(),
  /** Asked for where somebody was named before, for example because they are away. */
  reason: plainText(500).default(""),
});
export type NameReviewerInput = z.infer<typeof NameReviewerInput>;

export const SettlementChoice = z.strictObject({
  kind: z.enum(LINE_KINDS),
  number: LineNumber,
  field: z.string().min(1).max(80),
  choice: z.enum(["base", "theirs", "yours"]),
  why: sentenceText(500, "Say in a sentence why this value."),
});
export type SettlementChoice = z.infer<typeof SettlementChoice>;

export const CarryForwardInput = z.strictObject({
  proposalId: Id,
  lockVersion: z.int().min(0),
  /** The issue whose values the settlement table showed. */
  ontoIssue: z.int().positive(),
  settled: z.array(SettlementChoice).max(2000),
  key: IdempotencyKey,
});
export type CarryForwardInput = z.infer<typeof CarryForwardInput>;

/** The file itself comes as the request's body. */
export const AddFileInput = z.strictObject({
  productCode: ProductCode,
  proposalId: Id,
  place: z.enum(["working_copy", "proposal"], "Reload the page and try again."),
  name: fileName(160),
  sourceDate: z.iso.date("Give the date of the document first, for example 2026-03-31."),
});
export type AddFileInput = z.infer<typeof AddFileInput>;

export const VoidFileInput = z.strictObject({
  fileId: Id,
  reason: sentenceText(500, "Say in a sentence why nobody should rely on it."),
});
export type VoidFileInput = z.infer<typeof VoidFileInput>;

export const OpenLineHistoryInput = z.strictObject({ proposalId: Id, kind: z.enum(LINE_KINDS), number: LineNumber });
export type OpenLineHistoryInput = z.infer<typeof OpenLineHistoryInput>;
