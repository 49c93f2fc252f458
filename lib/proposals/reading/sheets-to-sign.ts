import type { Transaction } from "sequelize";
import { newestIssue, productById } from "@/lib/budget/load-budget";
import { namesOf } from "@/lib/budget/members";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import type { Capacity } from "@/lib/vocabulary/roles";
import { inSnapshot } from "@/models/database";
import { signingRights } from "@/policies/signing-rights";
import { budgetReader } from "../records/budget-reader";
import { unsettledRequests } from "../signing/demand-approvable";
import { effectSentence } from "../review/effect-sentence";
import { openedTexts } from "../records/opened-texts";
import { moveViews } from "./move-views";
import { listedProposals, type ListedProposal } from "./proposal-list";
import type { RoundReview } from "../review/round-review";
import type { PersonView } from "../views";

/** One proposal that the reader may approve now, as it stands at this moment. */
export interface SheetToSign {
  productCode: string;
  proposalId: number;
  key: string;
  label: string;
  title: string;
  neededBy: string | null;
  /** "Predicted falls by 3.90 N; inside again." */
  effect: string;
  capacity: Capacity;
  /** null where the reader signs in their own right. */
  deputyFor: PersonView | null;
  roundHash: string;
  textHash: string;
  /** Whether the reader has opened the sheet with this very text. */
  opened: boolean;
}

/** Everything that the reader may approve now, over all products, oldest first. */
export function sheetsToSign(actor: Actor, clock: Clock = systemClock): Promise<SheetToSign[]> {
  return inSnapshot(async (tx) => {
    const at = clock().toISOString();
    const sheets: Omit<SheetToSign, "opened">[] = [];
    for (const productId of new Set(actor.memberships.map((membership) => membership.productId))) {
      const { code } = await productById(productId, tx);
      if ((await newestIssue(productId, tx)) === null) continue;
      const people = new Map((await namesOf(productId, tx)).map(({ id, name }) => [id, name]));
      const reading = { at, budgets: budgetReader(productId, tx), tx, onlyOpen: true };
      for (const listed of (await listedProposals(actor, productId, people, reading)).reverse()) {
        sheets.push(...(await sheetsOf(actor, code, listed, tx)));
      }
    }
    const hashes = sheets.map(({ textHash }) => textHash);
    const opened = await openedTexts(actor.userId, hashes, tx);
    return sheets.map((sheet) => ({ ...sheet, opened: opened.has(sheet.textHash) }));
  });
}

async function sheetsOf(
  actor: Actor,
  productCode: string,
  { row, review }: ListedProposal,
  tx: Transaction,
): Promise<Omit<SheetToSign, "opened">[]> {
  if (!review) return [];
  const moves = moveViews(actor, review, await unsettledRequests(row.proposalId, tx));
  const capacities: Capacity[] = [
    ...(moves.sign_as_reviewer.allowed ? (["reviewer"] as const) : []),
    ...(moves.sign_as_program_manager.allowed ? (["program_manager"] as const) : []),
  ];
  // One person signs in one capacity: who could sign in both does so on the sheet itself, where they choose.
  const [capacity] = capacities;
  if (capacity === undefined) return [];
  const { proposalId, key, label, title, neededBy } = row;
  return [
    {
      ...{ productCode, proposalId, key, label, title, neededBy, capacity },
      effect: effectOf(review),
      deputyFor: deputyForOf(actor, capacity, review),
      roundHash: review.round.hash,
      textHash: review.textHash,
    },
  ];
}

function effectOf({ onToday: { change } }: RoundReview): string {
  const worst = change.effects.points.find(({ operatingPoint }) => operatingPoint === change.after.results.worstPoint);
  return worst ? effectSentence(worst) : "";
}

function deputyForOf(actor: Actor, capacity: Capacity, { signing }: RoundReview): PersonView | null {
  const rights = signingRights(capacity, signing).filter(({ userId }) => userId === actor.userId);
  if (rights.some(({ deputyFor }) => deputyFor === null)) return null;
  const deputyFor = rights[0]?.deputyFor;
  return deputyFor ? { id: deputyFor.userId, name: deputyFor.printedName } : null;
}
