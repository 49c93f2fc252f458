import { createHash } from "node:crypto";

export const HISTORY_RECIPE = "leeboard-history/1";

/** What the first entry of a chain follows. */
export const GENESIS_HASH = "0".repeat(64);

/** SHA-256 over recipe, predecessor and stored text: an entry that was moved, cut or edited no longer fits. */
export function entryHash(previousHash: string, canonicalText: string): string {
  return createHash("sha256").update(`${HISTORY_RECIPE}\n${previousHash}\n${canonicalText}`).digest("hex");
}
