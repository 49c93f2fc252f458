import type { Transaction } from "sequelize";
import { ReviewRulesBody } from "@/lib/evaluation/lines/terms-body";
import type { ReviewRules } from "@/lib/vocabulary/review-rules";
import { Round } from "@/models/round";
import type { DraftEdit, DraftTransfer } from "../schema";
import { storedChange } from "./working-copy";

/** One submission as it was kept. */
export interface RoundRecord {
  id: number;
  number: number;
  baseIssue: number;
  title: string;
  reason: string;
  neededBy: string | null;
  rules: ReviewRules;
  hash: string;
  submittedById: number;
  isSubmittedByManager: boolean;
  submittedAt: string;
  edits: DraftEdit[];
  transfers: DraftTransfer[];
}

export async function roundsOf(proposalId: number, tx: Transaction): Promise<RoundRecord[]> {
  const rows = await Round.findAll({ where: { proposalId }, order: [["number", "ASC"]], transaction: tx });
  const rounds: RoundRecord[] = [];
  for (const row of rows) rounds.push(await toRecord(row, tx));
  return rounds;
}

export async function roundOf(proposalId: number, number: number, tx: Transaction): Promise<RoundRecord | null> {
  const row = await Round.findOne({ where: { proposalId, number }, transaction: tx });
  return row ? toRecord(row, tx) : null;
}

async function toRecord(row: Round, tx: Transaction): Promise<RoundRecord> {
  const { id, number, baseIssue, title, reason, neededBy, hash, submittedById, submittedAt } = row;
  return {
    ...{ id, number, baseIssue, title, reason, neededBy: neededBy ?? null, hash, submittedById, submittedAt },
    rules: ReviewRulesBody.parse(JSON.parse(row.rules)),
    isSubmittedByManager: row.submittedAs === "program_manager",
    ...(await storedChange({ roundId: id }, tx)),
  };
}
