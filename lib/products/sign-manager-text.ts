import type { Transaction } from "sequelize";
import { textHash } from "@/lib/audit/text-hash";
import type { Actor } from "@/lib/vocabulary/actor";
import { Signature } from "@/models/signature";

export interface ManagerText {
  productId: number;
  subjectType: "establishment" | "baseline";
  baselineId: number | null;
  meaning: string;
  canonicalText: string;
  at: string;
}

/** A program manager's signature outside a round, next in the product's sequence; answers its hash. */
export async function signManagerText(
  actor: Actor,
  { productId, subjectType, baselineId, meaning, canonicalText, at }: ManagerText,
  tx: Transaction,
): Promise<string> {
  const hash = textHash("signature", canonicalText);
  const last: number | null = await Signature.max("sequence", { where: { productId }, transaction: tx });
  await Signature.create(
    {
      productId,
      sequence: (last ?? 0) + 1,
      subjectType,
      baselineId,
      signerId: actor.userId,
      printedName: actor.printedName,
      capacity: "program_manager",
      decision: "approve",
      meaning,
      canonicalText,
      hash,
      signedAt: at,
    },
    { transaction: tx },
  );
  return hash;
}
