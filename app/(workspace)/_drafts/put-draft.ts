import type { SavedDraft } from "@/lib/proposals/drafting/save-draft";
import type { DraftContent } from "@/lib/proposals/schema";
import type { DraftView } from "@/lib/proposals/workspace-views";
import type { FieldFault } from "@/lib/vocabulary/refusal";

/** The draft to be saved, and the saved state that the content was typed on. */
interface DraftSaving {
  productCode: string;
  proposalId: number;
  lockVersion: number;
  content: DraftContent;
}

export type DraftAnswer =
  | { state: "stored"; lockVersion: number; at: string; touchedElsewhere: DraftView["touchedElsewhere"] }
  /** Not saved, with the sentence why. */
  | { state: "failed"; sentence: string; faults: readonly FieldFault[]; triesAgain: boolean }
  /** Somebody else saved meanwhile. */
  | { state: "moved"; stored: DraftView };

/** Saves a draft on the server; a broken line is an answer like the others. */
export async function putDraft({ productCode, ...input }: DraftSaving): Promise<DraftAnswer> {
  let response: Response;
  try {
    response = await fetch(`/api/products/${productCode}/drafts/${input.proposalId}`, {
      method: "PUT",
      headers: { "content-type": "application/json" },
      body: JSON.stringify(input),
    });
  } catch {
    return { state: "failed", sentence: "no connection to the server", faults: [], triesAgain: true };
  }
  const answer: SavedDraft | Problem = await response.json();
  if ("outcome" in answer) {
    return answer.outcome === "saved"
      ? {
          state: "stored",
          lockVersion: answer.lockVersion,
          at: answer.savedAt,
          touchedElsewhere: answer.touchedElsewhere,
        }
      : { state: "moved", stored: answer.stored };
  }

  // What is refused as it stands is refused again: only a sign-out or a fault of the server may pass.
  const triesAgain = response.status === 401 || response.status >= 500;
  return { state: "failed", sentence: answer.sentence, faults: answer.faults, triesAgain };
}

interface Problem {
  sentence: string;
  faults: FieldFault[];
}
