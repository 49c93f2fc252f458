import type { Transaction } from "sequelize";
import { membersAt } from "@/lib/budget/members";
import type { WrittenIssue } from "@/lib/budget/write-issue";
import { termsOf } from "@/lib/evaluation/budget/indexed-state";
import { bandSide, plannedAt, type BandSide } from "@/lib/evaluation/budget/planned-profile";
import { Issue } from "@/models/issue";
import type { ProposalAct } from "../records/act-on-proposal";
import { mailFacts, mailMany } from "./mails";
import type { BudgetAtIssue } from "../review/preview-proposal";
import type { RoundReview } from "../review/round-review";

/**
 * Tells the program managers, once, that the predicted total has left the tolerance band of its planned profile. While
 * it stays outside further issues say nothing; after it came back, by an issue or because the plan moved, leaving it
 * is told again.
 */
export async function noteLeftPlannedBand(
  context: ProposalAct,
  { today, onToday, proposal }: RoundReview,
  issue: WrittenIssue,
): Promise<void> {
  const { tx, at, record } = context;
  const after = { issue: issue.number, ...onToday.change.after };
  const side = sideAt(after, issue.madeAt);
  if (side === null || side === "inside") return;
  const wasOutside = isOutside(sideAt(today, await madeAt(today.product.id, today.issue, tx)));
  if (wasOutside && isOutside(sideAt(today, issue.madeAt))) return;

  const { referenceOperatingPoint: operatingPoint, plannedProfile } = termsOf(after.state);
  const planned = plannedAt(plannedProfile, issue.madeAt);
  const label = `${proposal.productCode} issue ${issue.number}`;
  record({
    act: "leave_planned_band",
    subject: { type: "issue", id: String(issue.number), label },
    now: {
      ...{ operatingPoint, side },
      predictedNewtons: predictedOf(after).toFixed(2),
      plannedNewtons: ((planned?.predicted ?? 0) / 100).toFixed(2),
      toleranceNewtons: ((planned?.tolerance ?? 0) / 100).toFixed(2),
    },
  });
  const members = await membersAt(proposal.productId, at, tx);
  await mailMany(context, {
    template: "left_planned_band",
    occasion: "left the planned band",
    to: members.filter(({ roles }) => roles.includes("program_manager")).map(({ userId }) => userId),
    except: null,
    data: { ...mailFacts(proposal), issue: issue.number, operatingPoint, side },
  });
}

function sideAt(budget: BudgetAtIssue, at: string): BandSide | null {
  return bandSide(termsOf(budget.state).plannedProfile, at, predictedOf(budget));
}

function isOutside(side: BandSide | null): boolean {
  return side === "above" || side === "below";
}

/** The profile is of the reference operating point, which comes first in every result. */
function predictedOf({ results }: BudgetAtIssue): number {
  return results.points[0]?.totals.predicted ?? 0;
}

async function madeAt(productId: number, number: number, tx: Transaction): Promise<string> {
  return (await Issue.findOne({ where: { productId, number }, rejectOnEmpty: true, transaction: tx })).madeAt;
}
