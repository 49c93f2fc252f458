import type { Transaction } from "sequelize";
import { textHash } from "@/lib/audit/text-hash";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Decision } from "@/lib/vocabulary/proposals";
import type { Capacity } from "@/lib/vocabulary/roles";
import { Signature } from "@/models/signature";
import type { RoundReview } from "../review/round-review";
import { signedText } from "../review/signing-text";

export interface SignatureToWrite {
  decision: Decision;
  capacity: Capacity;
  meaning: string | null;
  reason: string | null;
  deputyForId: number | null;
  takesBackId: number | null;
}

/** Writes a signature with the text it stands under, exactly as that was shown, and the signer's own words. */
export async function writeSignature(
  actor: Actor,
  review: RoundReview,
  signature: SignatureToWrite,
  at: string,
  tx: Transaction,
): Promise<Signature> {
  const { productId } = review.proposal;
  const newest = await Signature.max<number | null, Signature>("sequence", { where: { productId }, transaction: tx });
  const deputyForName = signature.deputyForId === null ? null : (review.people.get(signature.deputyForId) ?? "");
  const canonicalText = signedText(review.text, {
    ...signature,
    printedName: actor.printedName,
    deputyForName,
    at,
    shownHash: review.textHash,
  });
  return Signature.create(
    {
      ...signature,
      productId,
      sequence: (newest ?? 0) + 1,
      subjectType: "round",
      roundId: review.round.id,
      signerId: actor.userId,
      printedName: actor.printedName,
      deputyForName,
      canonicalText,
      hash: textHash("signature", canonicalText),
      signedAt: at,
    },
    { transaction: tx },
  );
}
