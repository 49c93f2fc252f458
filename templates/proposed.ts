import { ROLE_NAMES, type Capacity } from "@/lib/vocabulary/roles";
import { proposalNotice, type MailFrame, type MailText, type ProposalFacts } from "./proposal-notice";

export interface ProposedFacts extends ProposalFacts {
  proposerName: string;
  round: number;
  capacity: Capacity;
  /** "2026-12-20" */
  neededBy: string | null;
}

/** To everyone who may sign the round in a capacity. Why they are asked says figures, so it stands on the sheet alone. */
export function proposed(frame: MailFrame, facts: ProposedFacts): MailText {
  const { label, proposerName, round, capacity, neededBy } = facts;
  const role = ROLE_NAMES[capacity].toLowerCase();
  const again = round > 1 ? ` (round ${round})` : "";
  return proposalNotice(frame, facts, {
    subject: `${label} waits for a ${role}'s signature`,
    sentences: [
      `${proposerName} has proposed ${label}${again}. You are asked as ${role}; why, and what it does, stands on the sheet.`,
      ...(neededBy === null ? [] : [`It is needed by ${neededBy}.`]),
    ],
  });
}
