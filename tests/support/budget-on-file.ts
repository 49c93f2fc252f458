import type { Transaction } from "sequelize";
import { performAct } from "@/lib/audit/perform-act";
import { textHash } from "@/lib/audit/text-hash";
import { loadNewestBudget, productByCode } from "@/lib/budget/load-budget";
import { writeIssue, type WrittenIssue } from "@/lib/budget/write-issue";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import type { LineEdit, TransferEdit } from "@/lib/evaluation/budget/edits";
import { previewChange } from "@/lib/evaluation/budget/preview-change";
import { newOperatingPoint } from "@/lib/evaluation/lines/operating-point-body";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import { firstIssueLines } from "@/lib/products/first-issue";
import type { Actor } from "@/lib/vocabulary/actor";
import { DEFAULT_REVIEW_RULES } from "@/lib/vocabulary/review-rules";
import type { Capacity } from "@/lib/vocabulary/roles";
import { inSnapshot } from "@/models/database";
import { Line } from "@/models/line";
import { Proposal } from "@/models/proposal";
import { ProposalEditor } from "@/models/proposal-editor";
import { Round } from "@/models/round";
import { RoundEdit } from "@/models/round-edit";
import { RoundTransfer } from "@/models/round-transfer";
import { Signature } from "@/models/signature";

/** Air at 15 °C and 25 m/s; limit and reserve in hundredths of a newton. */
export function firstPoint(limitHundredths: number) {
  return { ...newOperatingPoint(), name: "Cruise", speed: { value: 25, entered: "25 m/s" }, limitHundredths };
}

/** A bluff body: its drag is q · C_D · A, which a test can compute by hand. */
export function bluffItem(ownerId: number, dragCoefficient: number, area: number, more: object = {}) {
  const own = { method: "bluff-body", dragCoefficient, referenceArea: { value: area } };
  return { ...commonItem(ownerId), name: "Mirror", ...own, ...more };
}

export function shareItem(ownerId: number, fraction: number, of: readonly string[], more: object = {}) {
  const own = { method: "share", fraction, of, ofGroup: null, includeSavings: false };
  return { ...commonItem(ownerId), name: "Gaps", ...own, ...more };
}

/** A plate of 2.4 m by 0.95 m, both sides wetted, tripped at its edge, by the one-fifth law. */
export function plateItem(ownerId: number, methodVersion: number, more: object = {}) {
  const { source: _, ...common } = commonItem(ownerId);
  const size = { length: { value: 2.4 }, breadth: { value: 0.95 }, faces: 2, finish: "F30" };
  const own = { method: "flat-plate-friction", ...size, frictionLine: "one-fifth-law", transition: "tripped" };
  return { ...common, name: "Panel", ...own, methodVersion, ...more };
}

export function fixedItem(ownerId: number, newtons: number, more: object = {}) {
  return { ...commonItem(ownerId), name: "Lamp", method: "fixed", force: { value: newtons }, ...more };
}

function commonItem(ownerId: number) {
  return { ownerId, group: null, order: 10, grade: "estimated", saving: false, methodVersion: 1, source: "Test" };
}

export const addItem = (number: string, body: object): LineEdit => ({
  operation: "add",
  kind: "item",
  number,
  baseLetter: null,
  body,
});

/** Establishes without the command, so that tests of reading don't hash passwords. */
export async function establish(
  manager: Actor,
  code: string,
  at: string,
  { limit = 10000, reserve = 1000, point = {} }: { limit?: number; reserve?: number; point?: object } = {},
): Promise<WrittenIssue> {
  const frame = { act: "establish_product", chain: code } as const;
  return performAct(
    manager,
    () => new Date(at),
    frame,
    async (tx, record, now) => {
      const product = await productByCode(code, tx);
      const lines = firstIssueLines(product.kind, {
        productCode: code,
        operatingPoint: { number: "OP-1", body: { ...firstPoint(limit), ...point } },
        terms: newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: reserve }),
        password: "not asked",
      });
      const { name, kind } = product;
      const state = { product: { code, name, kind }, lines };
      const results = evaluateBudget(state);
      const issue = await writeIssue(
        { product, proposalId: null, at: now, changedLines: lines, state, resultsBefore: null, results },
        tx,
      );
      const subject = { type: "issue", id: "1", label: `${code} issue 1` };
      record({ act: "establish_product", subject, now: { ...issue } });
      return issue;
    },
  );
}

export interface ApprovedChange {
  proposer: Actor;
  signers: readonly (readonly [Actor, Capacity])[];
  edits: readonly LineEdit[];
  transfers?: readonly TransferEdit[];
  title?: string;
}

/** A change with its rows as the review leaves them, written without the review's commands. */
export async function approve(code: string, at: string, change: ApprovedChange): Promise<WrittenIssue> {
  const { proposer, signers, edits, transfers = [], title = "Change" } = change;
  const clock = () => new Date(at);
  return performAct(proposer, clock, { act: "approve_proposal", chain: code }, async (tx, record, now) => {
    const product = await productByCode(code, tx);
    const before = await loadNewestBudget(product.id, tx);
    const { after, faults, shortfall, changedLines } = previewChange(before.state, before.results, edits, transfers);
    if (faults.length > 0 || shortfall) throw new Error(JSON.stringify({ faults, shortfall }));

    const number = 1 + (await Proposal.count({ where: { productId: product.id }, transaction: tx }));
    const proposal = await Proposal.create(
      { productId: product.id, title, baseIssue: before.issue, proposerId: proposer.userId, createdAt: now },
      { transaction: tx },
    );
    const times = { firstEditAt: now, lastEditAt: now };
    await ProposalEditor.create({ proposalId: proposal.id, userId: proposer.userId, ...times }, { transaction: tx });
    const round = await Round.create(
      {
        proposalId: proposal.id,
        number: 1,
        baseIssue: before.issue,
        title,
        reason: "For the test",
        evidence: "[]",
        rules: JSON.stringify(DEFAULT_REVIEW_RULES),
        canonicalText: title,
        hash: textHash("round", title),
        submittedById: proposer.userId,
        submittedAt: now,
      },
      { transaction: tx },
    );
    await writeRoundContent(product.id, round.id, change, now, tx);
    await proposal.update({ number, round: 1, state: "proposed" }, { transaction: tx });
    for (const [signer, capacity] of signers) {
      const last: number | null = await Signature.max("sequence", {
        where: { productId: product.id },
        transaction: tx,
      });
      await Signature.create(
        {
          productId: product.id,
          sequence: (last ?? 0) + 1,
          subjectType: "round",
          roundId: round.id,
          signerId: signer.userId,
          printedName: signer.printedName,
          capacity,
          decision: "approve",
          meaning: "Checked",
          canonicalText: title,
          hash: textHash("signature", title),
          signedAt: now,
        },
        { transaction: tx },
      );
    }
    const issue = await writeIssue(
      {
        product,
        proposalId: proposal.id,
        at: now,
        changedLines,
        state: after.state,
        resultsBefore: before.results,
        results: after.results,
      },
      tx,
    );
    await proposal.update({ state: "approved", endedAt: now }, { transaction: tx });
    const subject = { type: "proposal", id: String(proposal.id), label: `${code}-CP-0${number}` };
    record({ act: "approve_proposal", subject, now: { ...issue } });
    return issue;
  });
}

async function writeRoundContent(
  productId: number,
  roundId: number,
  { edits, transfers = [] }: ApprovedChange,
  at: string,
  tx: Transaction,
): Promise<void> {
  for (const [position, { kind, number, operation, baseLetter, body }] of edits.entries()) {
    const key = { productId, kind, number };
    const line =
      (await Line.findOne({ where: key, transaction: tx })) ??
      (await Line.create({ ...key, reservedAt: at }, { transaction: tx }));
    const text = body === null ? null : JSON.stringify(body);
    const row = { roundId, position, lineId: line.id, operation, baseLetter, body: text };
    await RoundEdit.create(row, { transaction: tx });
  }
  for (const [position, transfer] of transfers.entries()) {
    await RoundTransfer.create({ roundId, position, body: JSON.stringify(transfer) }, { transaction: tx });
  }
}

export async function newestBudget(code: string) {
  return inSnapshot(async (tx) => loadNewestBudget((await productByCode(code, tx)).id, tx));
}
