import { z } from "zod";
import { CAPACITIES } from "@/lib/vocabulary/roles";
import { approvalTakenBack, approved, disapproved, returned, signed, withdrawn } from "@/templates/decided";
import { evidenceAdded, evidenceVoided } from "@/templates/evidence";
import { aheadChanged, leftPlannedBand, overtaken, reminder, superseded } from "@/templates/moved";
import type { MailFrame, MailText } from "@/templates/proposal-notice";
import { proposed } from "@/templates/proposed";
import { remarkAddressed, remarkAnswered, remarkAsksAction, remarkSettled } from "@/templates/remarks";

const Proposal = z.strictObject({
  productCode: z.string(),
  productName: z.string(),
  label: z.string(),
  proposalNumber: z.int(),
});
const ByActor = Proposal.extend({ actorName: z.string() });
const Remark = Proposal.extend({ authorName: z.string(), remarkNumber: z.int() });
const Lines = z.array(z.string());

/** What each mail needs to know; kept in the outbox as JSON and read back through the same schema. */
const SCHEMAS = {
  // Not strict: those that were put in before the reasons were left out still go.
  proposed: z.object({
    ...Proposal.shape,
    proposerName: z.string(),
    round: z.int(),
    capacity: z.enum(CAPACITIES),
    neededBy: z.string().nullable(),
  }),
  signed: ByActor.extend({ capacity: z.enum(CAPACITIES), stillNeeded: Lines }),
  approved: Proposal.extend({ issue: z.int(), signerNames: Lines }),
  returned: ByActor,
  disapproved: ByActor,
  withdrawn: ByActor,
  approval_taken_back: ByActor,
  superseded: Proposal.extend({ proposerName: z.string(), signedRound: z.int(), round: z.int(), moved: Lines }),
  overtaken: Proposal.extend({ because: Lines }),
  ahead_changed: Proposal.extend({ issue: z.int(), behind: Lines }),
  left_planned_band: Proposal.extend({
    issue: z.int(),
    operatingPoint: z.string(),
    side: z.enum(["above", "below"]),
  }),
  reminder: Proposal.extend({ proposerName: z.string(), neededBy: z.string() }),
  remark_addressed: Remark,
  remark_asks_action: Remark,
  remark_answered: Remark,
  remark_settled: Remark,
  evidence_added: ByActor,
  evidence_voided: ByActor,
};

export type MailTemplate = keyof typeof SCHEMAS;
export type MailData = { [T in MailTemplate]: z.infer<(typeof SCHEMAS)[T]> };

type Render = (frame: MailFrame, stored: unknown) => MailText;

function renderer<Data>(schema: z.ZodType<Data>, template: (frame: MailFrame, data: Data) => MailText): Render {
  return (frame, stored) => template(frame, schema.parse(stored));
}

const RENDERERS: Record<MailTemplate, Render> = {
  proposed: renderer(SCHEMAS.proposed, proposed),
  signed: renderer(SCHEMAS.signed, signed),
  approved: renderer(SCHEMAS.approved, approved),
  returned: renderer(SCHEMAS.returned, returned),
  disapproved: renderer(SCHEMAS.disapproved, disapproved),
  withdrawn: renderer(SCHEMAS.withdrawn, withdrawn),
  approval_taken_back: renderer(SCHEMAS.approval_taken_back, approvalTakenBack),
  superseded: renderer(SCHEMAS.superseded, superseded),
  overtaken: renderer(SCHEMAS.overtaken, overtaken),
  ahead_changed: renderer(SCHEMAS.ahead_changed, aheadChanged),
  left_planned_band: renderer(SCHEMAS.left_planned_band, leftPlannedBand),
  reminder: renderer(SCHEMAS.reminder, reminder),
  remark_addressed: renderer(SCHEMAS.remark_addressed, remarkAddressed),
  remark_asks_action: renderer(SCHEMAS.remark_asks_action, remarkAsksAction),
  remark_answered: renderer(SCHEMAS.remark_answered, remarkAnswered),
  remark_settled: renderer(SCHEMAS.remark_settled, remarkSettled),
  evidence_added: renderer(SCHEMAS.evidence_added, evidenceAdded),
  evidence_voided: renderer(SCHEMAS.evidence_voided, evidenceVoided),
};

/** The text of a stored message. Throws when the template or its data are not what they were written as. */
export function renderMail(template: string, stored: unknown, frame: MailFrame): MailText {
  const render: Render | undefined = new Map<string, Render>(Object.entries(RENDERERS)).get(template);
  if (!render) throw new Error(`There is no mail ${template}.`);
  return render(frame, stored);
}
