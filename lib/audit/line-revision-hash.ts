import type { LineKind } from "@/lib/vocabulary/lines";
import { canonicalJson } from "./canonical-json";
import { textHash } from "./text-hash";

export interface HashedRevision {
  productCode: string;
  kind: LineKind;
  number: string;
  letter: string;
  retired: boolean;
  /** Canonical JSON text, as stored. */
  body: string;
}

/** Hash of one revision of a line: what it is a revision of, its letter and its body. */
export function lineRevisionHash({ productCode, kind, number, letter, retired, body }: HashedRevision): string {
  return textHash("line", canonicalJson({ productCode, kind, number, letter, retired, body }));
}
