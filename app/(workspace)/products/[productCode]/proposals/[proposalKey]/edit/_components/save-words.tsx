"use client";

import { Button } from "@/app/_components/button";
import { Notice } from "@/app/_components/notice";
import type { DraftView } from "@/lib/proposals/workspace-views";

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
      return "Not saved: somebody else saved meanwhile.";
  }
}

interface MovedNoticeProps {
  stored: DraftView;
  settle: (whose: "mine" | "theirs", stored: DraftView) => void;
}

/** Two editors of one draft: what the other saved, before either loses anything. */
export function MovedNotice({ stored, settle }: MovedNoticeProps) {
  return (
    <Notice kind="caution">
      <p>
        {stored.savedBy.name} saved this draft at {stored.savedAt.slice(11, 16)} UTC. What you typed since is still here
        and not saved.
      </p>
      <details className="mt-1">
        <summary className="link">What {stored.savedBy.name} saved</summary>
        <pre className="mt-1 max-h-60 overflow-auto font-code text-xs whitespace-pre-wrap">
          {JSON.stringify(stored.content, null, 1)}
        </pre>
      </details>
      <div className="mt-2 flex flex-wrap gap-2">
        <Button onClick={() => settle("mine", stored)}>Save mine over it</Button>
        <Button onClick={() => settle("theirs", stored)}>Take theirs, drop mine</Button>
      </div>
    </Notice>
  );
}
