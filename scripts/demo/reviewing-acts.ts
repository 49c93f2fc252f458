import { addRemark } from "@/lib/proposals/remarks/add-remark";
import { fileToOpen, noteOpening } from "@/lib/proposals/files/open-file";
import { raiseObjection } from "@/lib/proposals/signing/raise-objection";
import { returnProposal } from "@/lib/proposals/signing/return-proposal";
import { AddRemarkInput, ReturnProposalInput, SignProposalInput } from "@/lib/proposals/schema";
import { settleRemark } from "@/lib/proposals/remarks/settle-remark";
import { signProposal } from "@/lib/proposals/signing/sign-proposal";
import { SIGNATURE_MEANINGS } from "@/lib/vocabulary/proposals";
import type { Capacity } from "@/lib/vocabulary/roles";
import { Attachment } from "@/models/attachment";
import { cited, type DemoFile } from "./demo-files";
import type { Desk } from "./desk";
import { DEMO_PASSWORD, type DemoPerson } from "./people";
import { shownSheet } from "./shown-sheet";

interface DemoRemark {
  text: string;
  line?: { kind: string; number: string };
  field?: string;
  asksForAction?: boolean;
}

export function reviewingActs({ house, productCode, key, deliverMail }: Desk) {
  const approve = (person: DemoPerson, capacity: Capacity, proposalId: number) =>
    sign(person, proposalId, { decision: "approve", capacity, meaning: SIGNATURE_MEANINGS[capacity][0] });

  const disapprove = (person: DemoPerson, proposalId: number, reason: string) =>
    sign(person, proposalId, { decision: "disapprove", capacity: "program_manager", reason });

  async function sign(person: DemoPerson, proposalId: number, decision: Record<string, string>): Promise<void> {
    const { roundHash, textHash } = await shownSheet(proposalId, house.clock);
    const shown = { proposalId, roundHash, textHash, deputyForId: null, password: DEMO_PASSWORD };
    await signProposal(await house.actor(person), SignProposalInput.parse({ ...shown, ...decision }), house.clock);
    await deliverMail();
  }

  async function giveBack(person: DemoPerson, proposalId: number, reason: string): Promise<void> {
    const { roundHash } = await shownSheet(proposalId, house.clock);
    const input = ReturnProposalInput.parse({ proposalId, roundHash, capacity: "reviewer", reason });
    await returnProposal(await house.actor(person), input, house.clock);
    await deliverMail();
  }

  async function remark(person: DemoPerson, proposalId: number, said: DemoRemark, parentId: number | null = null) {
    const { text, line = null, field = null, asksForAction = false } = said;
    const input = { proposalId, parentId, line, field, text, suggestion: null, asksForAction, key: key() };
    const added = await addRemark(await house.actor(person), AddRemarkInput.parse(input), house.clock);
    await deliverMail();
    return added;
  }

  /** Downloads a file of the product, by its content. */
  async function opens(person: DemoPerson, file: DemoFile): Promise<void> {
    const actor = await house.actor(person);
    const row = await Attachment.findOne({ where: { sha256: cited(file).sha256 }, rejectOnEmpty: true });
    const opened = await fileToOpen(actor, productCode, row.id);
    await noteOpening(actor, opened.file, house.clock);
  }

  async function settle(person: DemoPerson, remarkId: number, reason: string): Promise<void> {
    await settleRemark(await house.actor(person), { remarkId, reason }, house.clock);
  }

  async function object(person: DemoPerson, proposalId: number, reason: string): Promise<void> {
    await raiseObjection(await house.actor(person), { proposalId, reason, key: key() }, house.clock);
    await deliverMail();
  }

  return { approve, disapprove, giveBack, remark, settle, object, opens };
}
