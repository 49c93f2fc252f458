import { recomputeIssue } from "@/lib/budget/recompute-issue";
import { inSnapshot } from "@/models/database";
import { conservationFaults } from "./conservation";
import { fileContentFaults } from "./files";
import { historyFaults } from "./history";
import { chainLinkFaults, endStateFaults, issueNumberFaults, revisionLetterFaults } from "./numbering";
import { rows } from "./rows";
import { approvalFaults, independenceFaults } from "./signing";

/** Everything that speaks against the ten invariants of the open database, each as a sentence that begins with its number. */
export async function invariantFaults(): Promise<string[]> {
  return [
    ...(await issueNumberFaults()),
    ...(await revisionLetterFaults()),
    ...(await independenceFaults()),
    ...(await chainLinkFaults()),
    ...(await endStateFaults()),
    ...(await conservationFaults()),
    ...(await approvalFaults()),
    ...(await recomputationFaults()),
    ...(await historyFaults()),
    ...(await fileContentFaults()),
  ];
}

/** 8: recomputing all results of an issue with the versions that its lines name gives the stored ones. */
async function recomputationFaults(): Promise<string[]> {
  const issues = await rows<{ product: number; number: number }>(
    "SELECT product_id AS product, number FROM issues ORDER BY product_id, number",
  );
  const faults: string[] = [];
  for (const { product, number } of issues) {
    const differences = await inSnapshot((tx) => recomputeIssue(product, number, tx));
    faults.push(
      ...differences.map(
        ({ operatingPoint, item, quantity, stored, recomputed }) =>
          `8: product ${product} issue ${number}, ${item} at ${operatingPoint}: ${quantity} ${stored}, again ${recomputed}.`,
      ),
    );
  }
  return faults;
}
