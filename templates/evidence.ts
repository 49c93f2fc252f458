import { proposalNotice, type MailFrame, type MailText, type ProposalFacts } from "./proposal-notice";

export interface EvidenceFacts extends ProposalFacts {
  actorName: string;
}

/** To the editors and to who may sign or has signed: there is more to read than when they were asked. */
export function evidenceAdded(frame: MailFrame, facts: EvidenceFacts): MailText {
  const { label, actorName } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label}: a file was added`,
    sentences: [`${actorName} has added a file of evidence beside ${label}. No signature covers it.`],
  });
}

/** To the same people: what they relied on is not to be relied on. */
export function evidenceVoided(frame: MailFrame, facts: EvidenceFacts): MailText {
  const { label, actorName } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label}: a file was voided`,
    sentences: [
      `${actorName} has voided a file of evidence of ${label}. The sheet says which and why; read it again before you sign it.`,
    ],
  });
}
