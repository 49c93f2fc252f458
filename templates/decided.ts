import { ROLE_NAMES, type Capacity } from "@/lib/vocabulary/roles";
import { proposalNotice, type MailFrame, type MailText, type ProposalFacts } from "./proposal-notice";

export interface ActorFacts extends ProposalFacts {
  actorName: string;
}

export interface SignedFacts extends ActorFacts {
  capacity: Capacity;
  /** What is still to be signed, in words: "a program manager". */
  stillNeeded: string[];
}

export interface ApprovedFacts extends ProposalFacts {
  issue: number;
  signerNames: string[];
}

/** To the proposer and the co-editors: one signature is there, others are still asked for. */
export function signed(frame: MailFrame, facts: SignedFacts): MailText {
  const { label, actorName, capacity, stillNeeded } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label}: signed by ${actorName}`,
    sentences: [`${actorName} has signed ${label} as ${ROLE_NAMES[capacity].toLowerCase()}. Still asked for:`],
    listing: stillNeeded,
  });
}

/** To the proposer and everyone who had a part: the last signature made the next issue. */
export function approved(frame: MailFrame, facts: ApprovedFacts): MailText {
  const { label, productName, issue, signerNames } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label} is approved: issue ${issue}`,
    sentences: [`${label} is approved and took effect as issue ${issue} of ${productName}. It was signed by:`],
    listing: signerNames,
  });
}

/** To the proposer and the co-editors: a signer wants it changed. */
export function returned(frame: MailFrame, facts: ActorFacts): MailText {
  const { label, actorName } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label} is returned`,
    sentences: [
      `${actorName} has returned ${label} to you. The reason stands on its sheet; revise it and propose it again.`,
    ],
  });
}

/** To the proposer and everyone who had a part. */
export function disapproved(frame: MailFrame, facts: ActorFacts): MailText {
  const { label, actorName } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label} is disapproved`,
    sentences: [`${actorName} has disapproved ${label}. The reason stands on its sheet; the budget stays as it was.`],
  });
}

/** To those who were asked to sign: nothing waits for them any more. */
export function withdrawn(frame: MailFrame, facts: ActorFacts): MailText {
  const { label, actorName } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label} is withdrawn`,
    sentences: [`${actorName} has withdrawn ${label}. You are no longer asked to sign it.`],
  });
}

/** To the proposer and the other signers: an approval no longer counts. */
export function approvalTakenBack(frame: MailFrame, facts: ActorFacts): MailText {
  const { label, actorName } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label}: an approval is taken back`,
    sentences: [`${actorName} has taken back their approval of ${label}. The reason stands on its sheet.`],
  });
}
