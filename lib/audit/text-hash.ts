import { createHash } from "node:crypto";

/** What a hash is of: the kind is part of the recipe, so that no text stands for a text of another kind. */
export type HashedKind = "round" | "signature" | "line" | "issue" | "record" | "monte-carlo" | "monte-carlo-result";

/** SHA-256 of a canonical text, in hexadecimal. */
export function textHash(kind: HashedKind, text: string): string {
  return createHash("sha256").update(`leeboard-${kind}/1\n${text}`).digest("hex");
}
