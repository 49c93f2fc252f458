import type { Transaction } from "sequelize";
import { performAct } from "@/lib/audit/perform-act";
import type { Act, ActRecord } from "@/lib/vocabulary/acts";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { inSnapshot } from "@/models/database";
import { proposalById, subjectOf, type ProposalRecord } from "./proposal-record";

export interface ProposalAct {
  tx: Transaction;
  at: string;
  proposal: ProposalRecord;
  /** Writes the act into the history; of its own act and this proposal unless said otherwise. */
  record(details: Partial<ActRecord>): void;
}

/** An act on one proposal: its product's chain, its name in the history, and the proposal as it stands now. */
export async function actOnProposal<T>(
  actor: Actor,
  clock: Clock,
  { act, proposalId }: { act: Act; proposalId: number },
  work: (context: ProposalAct) => Promise<T>,
): Promise<T> {
  const named = await inSnapshot((tx) => proposalById(proposalId, tx));
  const subject = subjectOf(named);
  return performAct(actor, clock, { act, chain: named.productCode, subject }, async (tx, record, at) => {
    const proposal = await proposalById(proposalId, tx);
    return work({ tx, at, proposal, record: (details) => record({ act, subject, ...details }) });
  });
}
