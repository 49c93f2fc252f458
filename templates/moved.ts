import { proposalNotice, type MailFrame, type MailText, type ProposalFacts } from "./proposal-notice";

export interface SupersededFacts extends ProposalFacts {
  proposerName: string;
  /** The round that was signed. */
  signedRound: number;
  /** The round that stands now. */
  round: number;
  /** Lines and transfers that moved: "Item 050 Side mirrors". */
  moved: string[];
}

export interface OvertakenFacts extends ProposalFacts {
  /** What has changed since, a sentence each. */
  because: string[];
}

export interface LeftPlannedBandFacts extends ProposalFacts {
  issue: number;
  /** The reference operating point, for which the profile is planned. */
  operatingPoint: string;
  side: "above" | "below";
}

export interface ReminderFacts extends ProposalFacts {
  proposerName: string;
  /** "2026-12-20" */
  neededBy: string;
}

export interface AheadChangedFacts extends ProposalFacts {
  issue: number;
  /** "020 Mid panels, outer, behind 010" */
  behind: string[];
}

/** To the signer of an earlier round: their signature no longer counts, and what moved since. */
export function superseded(frame: MailFrame, facts: SupersededFacts): MailText {
  const { label, proposerName, signedRound, round, moved } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label}: round ${round} replaces what you signed`,
    sentences: [
      `${proposerName} has submitted round ${round} of ${label}. Your signature on round ${signedRound} stays visible and no longer counts. Moved since you signed:`,
    ],
    listing: moved,
  });
}

/** To the proposer and the co-editors: another issue went past it. */
export function overtaken(frame: MailFrame, facts: OvertakenFacts): MailText {
  const { label, because } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label} is overtaken`,
    sentences: [`${label} was drafted on an earlier issue and can't be approved until it is carried forward, because:`],
    listing: because,
  });
}

/** To the program managers, once until it has come back: the total no longer keeps to its plan. */
export function leftPlannedBand(frame: MailFrame, facts: LeftPlannedBandFacts): MailText {
  const { label, productName, issue, operatingPoint, side } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label}: predicted leaves its planned profile`,
    sentences: [
      `With issue ${issue}, made by ${label}, the predicted total of ${productName} at ${operatingPoint} is ${side} the tolerance band of its planned profile.`,
      "This is told once. Further issues outside the band send nothing, until it has come back and leaves it again.",
    ],
  });
}

/** To the signers, then the program manager, when the needed-by date has passed. */
export function reminder(frame: MailFrame, facts: ReminderFacts): MailText {
  const { label, proposerName, neededBy } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label} was needed by ${neededBy}`,
    sentences: [
      `${label} by ${proposerName} was needed by ${neededBy} and still waits for signatures. It stays proposed until somebody signs or returns it.`,
    ],
  });
}

/** To the owner of a plate: another that lies ahead of it has changed, and the layer that arrives with it. */
export function aheadChanged(frame: MailFrame, facts: AheadChangedFacts): MailText {
  const { label, issue, behind } = facts;
  return proposalNotice(frame, facts, {
    subject: `${label} changed a plate ahead of yours: issue ${issue}`,
    sentences: [
      `${label} took effect as issue ${issue} and changed a plate that lies ahead of an item of yours. Look whether your run-up still holds:`,
    ],
    listing: behind,
  });
}
