import { proposalNotice, type MailFrame, type MailText, type ProposalFacts } from "./proposal-notice";

export interface RemarkFacts extends ProposalFacts {
  authorName: string;
  /** R3 of the proposal has number 3. */
  remarkNumber: number;
}

/** To those to whom a remark is addressed. */
export function remarkAddressed(frame: MailFrame, facts: RemarkFacts): MailText {
  const { label, authorName, remarkNumber } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label}: remark R${remarkNumber} is addressed to you`,
    sentences: [`${authorName} addresses you in remark R${remarkNumber} on ${label}.`],
  });
}

/** To the proposer and the co-editors: no approval is taken until this remark is settled. */
export function remarkAsksAction(frame: MailFrame, facts: RemarkFacts): MailText {
  const { label, authorName, remarkNumber } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label}: remark R${remarkNumber} asks for action`,
    sentences: [
      `${authorName} asks for action in remark R${remarkNumber} on ${label}. No approving signature is taken until it is settled.`,
    ],
  });
}

/** To who raised the remark. */
export function remarkAnswered(frame: MailFrame, facts: RemarkFacts): MailText {
  const { label, authorName, remarkNumber } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label}: remark R${remarkNumber} is answered`,
    sentences: [
      `${authorName} has answered your remark R${remarkNumber} on ${label}. If it asked for action, settle it or say what is missing.`,
    ],
  });
}

/** To the proposer and the co-editors. */
export function remarkSettled(frame: MailFrame, facts: RemarkFacts): MailText {
  const { label, authorName, remarkNumber } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label}: remark R${remarkNumber} is settled`,
    sentences: [`${authorName} has settled remark R${remarkNumber} on ${label}.`],
  });
}
