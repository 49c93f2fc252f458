"use client";

import type { SaveState } from "./use-saved-draft";

/** Whether what was typed is kept, in words. */
export function SaveWords({ save }: { save: SaveState }) {
  return (
    <p role="status" className="text-sm text-ink-2" data-testid="save-state">
      {wordsOf(save)}
    </p>
  );
}

function wordsOf(save: SaveState): string {
  switch (save.state) {
    case "saved":
      return `Saved ${save.at.slice(11, 16)} UTC`;
    case "waiting":
    case "saving":
      return "Saving…";
    case "failed":
      return `Not saved: ${save.sentence}${save.triesAgain ? " It is kept on this device and tried again." : ""}`;
    case "moved":
      return "Not saved: a co-editor changed the same field meanwhile.";
  }
}
