export const PROPOSAL_STATES = ["draft", "proposed", "returned", "approved", "disapproved", "withdrawn"] as const;
export type ProposalState = (typeof PROPOSAL_STATES)[number];

export const END_STATES: readonly ProposalState[] = ["approved", "disapproved", "withdrawn"];

export const DECISIONS = ["approve", "return", "disapprove", "take_back"] as const;
export type Decision = (typeof DECISIONS)[number];

/** What a signature means in words; the signer chooses one. */
export const SIGNATURE_MEANINGS = {
  reviewer: [
    "Inputs, method and evidence checked",
    "Calculation repeated independently",
    "Change accepted on the evidence cited",
  ],
  program_manager: ["Effect on the budget accepted", "Approved for the next issue"],
} as const;

/** "TF2-CP-04": product code, change proposal, number of at least two digits. */
export function proposalLabel(productCode: string, number: number): string {
  return `${productCode}-CP-${String(number).padStart(2, "0")}`;
}
