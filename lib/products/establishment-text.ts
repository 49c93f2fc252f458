import { canonicalLineText } from "@/lib/evaluation/lines/canonical-line-text";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { nameBookOf } from "@/lib/evaluation/lines/name-book";
import { PRODUCT_KIND_NAMES } from "@/lib/vocabulary/lines";

export const ESTABLISHMENT_MEANING = "Budget established with this limit, reserve and terms";

export interface Establishment {
  state: BudgetState;
  contentHash: string;
  signer: { userId: number; printedName: string };
  at: string;
}

/** What the establishing signature stands under: issue 1 with every line, every field in SI. */
export function establishmentText({ state, contentHash, signer, at }: Establishment): string {
  const names = nameBookOf(state, new Map());
  const { code, name, kind } = state.product;
  const head = [
    "leeboard-establishment/1",
    `product: ${code} ${name} (${PRODUCT_KIND_NAMES[kind]})`,
    "issue: 1",
    `content: ${contentHash}`,
    "capacity: program_manager",
    `meaning: ${ESTABLISHMENT_MEANING}`,
    `signer: ${signer.printedName} (${signer.userId})`,
    `signed: ${at}`,
  ];
  return [...head, ...state.lines.map((line) => canonicalLineText(line, names))].join("\n");
}
