"use client";

import { useDeferredValue, useMemo } from "react";

import type { EditorView } from "@/lib/proposals/reading/editor-view";
import { previewProposal, type ProposalPreview } from "@/lib/proposals/review/preview-proposal";
import type { DraftContent } from "@/lib/proposals/schema";

/** The effect of what is typed, computed here by the code that decides on the server. */
export function usePreview({ budget, routing, owners }: EditorView, content: DraftContent): ProposalPreview {
  const { edits, transfers } = useDeferredValue(content);

  return useMemo(
    () =>
      previewProposal(budget, { edits, transfers }, routing, {
        mayOwn: (userId) => owners.some(({ id }) => id === userId),
      }),
    [budget, edits, transfers, routing, owners],
  );
}
