import { namesOf } from "@/lib/budget/members";
import { enqueueMail } from "@/lib/mail/enqueue";
import type { MailData, MailTemplate } from "@/lib/mail/message-schemas";
import type { Actor } from "@/lib/vocabulary/actor";
import { ROLE_NAMES, type Capacity } from "@/lib/vocabulary/roles";
import type { RequiredCapacity, RoutedCapacity } from "@/policies/approval-routing";
import type { ProposalAct } from "../records/act-on-proposal";
import type { RoundRecord } from "../records/round-record";
import { labelOf, type ProposalRecord } from "../records/proposal-record";
import { signaturesOf, type SignatureRecord } from "../records/signature-records";

type ProposalFacts = Pick<MailData["returned"], "productCode" | "productName" | "label" | "proposalNumber">;
type Context = Pick<ProposalAct, "tx" | "at" | "proposal">;

interface MailToMany<T extends MailTemplate> {
  template: T;
  /** With person and proposal the key under which one mail goes out and no second one. */
  occasion: string;
  to: readonly number[];
  /** Who did it is not told of it. */
  except: Actor | null;
  data: MailData[T];
}

/** One mail per person, proposal and state; answers how many are new. */
export async function mailMany<T extends MailTemplate>(
  { tx, at, proposal }: Context,
  mail: MailToMany<T>,
): Promise<number> {
  let sent = 0;
  for (const toUserId of new Set(mail.to)) {
    if (toUserId === mail.except?.userId) continue;
    const key = `proposal ${proposal.id}, ${mail.occasion}, person ${toUserId}`;
    if (await enqueueMail({ key, toUserId, template: mail.template, data: mail.data }, tx, at)) sent += 1;
  }
  return sent;
}

/** Proposals get mails from their first submission on, when they have a number. */
export function mailFacts(proposal: ProposalRecord): ProposalFacts {
  const { productCode, productName, number } = proposal;
  return { productCode, productName, label: labelOf(proposal), proposalNumber: number ?? 0 };
}

export function editorsOf({ proposerId, coEditorIds }: ProposalRecord): number[] {
  return [proposerId, ...coEditorIds];
}

/** To everyone who may fill a capacity that is asked for; who was asked in this round before gets no second mail. */
export async function mailProposed(
  actor: Actor | null,
  context: Context,
  { routing, round }: { routing: readonly RoutedCapacity[]; round: RoundRecord },
): Promise<void> {
  const { people, ...facts } = await proposerFacts(context);
  for (const { capacity, maySign, signedBySubmitting } of routing) {
    if (signedBySubmitting) continue;
    await mailMany(context, {
      template: "proposed",
      occasion: `proposed in round ${round.number}`,
      to: maySign.map(({ userId }) => userId),
      except: actor,
      data: {
        ...facts,
        proposerName: people.get(round.submittedById) ?? "",
        ...{ round: round.number, capacity, neededBy: round.neededBy },
      },
    });
  }
}

async function proposerFacts({ proposal, tx }: Context) {
  const people = new Map((await namesOf(proposal.productId, tx)).map(({ id, name }) => [id, name]));
  return { ...mailFacts(proposal), people };
}

/** To the signers of the round before: what moved since. It stands in for the mail that asks them to sign. */
export async function mailSuperseded(
  actor: Actor,
  context: Context,
  { round, moved }: { round: number; moved: string[] },
): Promise<void> {
  const signatures = await signaturesOf(context.proposal.id, context.tx);
  await mailMany(context, {
    template: "superseded",
    occasion: `proposed in round ${round}`,
    to: signatures.filter((signature) => signature.round === round - 1).map(({ signerId }) => signerId),
    except: actor,
    data: { ...mailFacts(context.proposal), proposerName: actor.printedName, signedRound: round - 1, round, moved },
  });
}

export function mailSigned(
  actor: Actor,
  context: Context,
  signed: { capacity: Capacity; signatureId: number; missing: readonly RequiredCapacity[] },
): Promise<number> {
  const stillNeeded = signed.missing.map(({ capacity }) => `a ${ROLE_NAMES[capacity].toLowerCase()}`);
  return mailMany(context, {
    template: "signed",
    occasion: `signature ${signed.signatureId}`,
    to: editorsOf(context.proposal),
    except: actor,
    data: { ...mailFacts(context.proposal), actorName: actor.printedName, capacity: signed.capacity, stillNeeded },
  });
}

export function mailApproved(
  actor: Actor,
  context: Context,
  { issue, approvals }: { issue: number; approvals: readonly SignatureRecord[] },
): Promise<number> {
  return mailMany(context, {
    template: "approved",
    occasion: "approved",
    to: [...editorsOf(context.proposal), ...context.proposal.editorIds, ...approvals.map(({ signerId }) => signerId)],
    except: actor,
    data: {
      ...mailFacts(context.proposal),
      issue,
      signerNames: [...approvals.map(({ printedName }) => printedName), actor.printedName],
    },
  });
}

/** A return, a disapproval or an approval taken back, to its editors and whoever signed. */
export async function mailDecided(
  actor: Actor,
  context: Context,
  template: "returned" | "disapproved" | "approval_taken_back",
): Promise<void> {
  const { proposal, tx, at } = context;
  const signers = (await signaturesOf(proposal.id, tx)).filter(({ round }) => round === proposal.round);
  await mailMany(context, {
    template,
    occasion:
      template === "approval_taken_back" ? `approval taken back at ${at}` : `${template} in round ${proposal.round}`,
    to: [...editorsOf(proposal), ...(template === "returned" ? [] : signers.map(({ signerId }) => signerId))],
    except: actor,
    data: { ...mailFacts(proposal), actorName: actor.printedName },
  });
}
