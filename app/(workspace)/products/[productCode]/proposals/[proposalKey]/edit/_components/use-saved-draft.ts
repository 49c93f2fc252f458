"use client";

import { useCallback, useEffect, useRef, useState } from "react";

import { type DraftAnswer, putDraft } from "@/app/(workspace)/_drafts/put-draft";
import { sameValue } from "@/lib/proposals/same-value";
import type { DraftContent } from "@/lib/proposals/schema";
import type { DraftView } from "@/lib/proposals/workspace-views";

import { type Backup, dropBackup, keepBackup, readBackup } from "./draft-backup";

export type SaveState =
  | { state: "saved"; at: string }
  | { state: "waiting" }
  | { state: "saving" }
  /** What was typed is kept on this device. */
  | Extract<DraftAnswer, { state: "failed" | "moved" }>;

const PAUSE_MS = 700;
const RETRY_MS = 5000;

/** What is typed and the saved state that it stands on, both kept on this device as well. */
function useTypedContent({ proposalId, ...draft }: DraftView) {
  const [content, setContent] = useState<DraftContent>(draft.content);
  const [lockVersion, setLockVersion] = useState(draft.lockVersion);
  const newest = useRef(content);
  const lock = useRef(lockVersion);

  const type = useCallback(
    (next: DraftContent) => {
      newest.current = next;
      keepBackup(proposalId, { lockVersion: lock.current, content: next });
      setContent(next);
    },
    [proposalId],
  );
  const adopt = useCallback(
    (version: number) => {
      lock.current = version;
      setLockVersion(version);
      keepBackup(proposalId, { lockVersion: version, content: newest.current });
    },
    [proposalId],
  );

  const current = useCallback(() => ({ lockVersion: lock.current, content: newest.current }), []);

  return { content, lockVersion, current, type, adopt };
}

/** Keeps a draft: on the server a moment after the last keystroke, and on this device until the server has it. */
export function useSavedDraft(draft: DraftView) {
  const { content, lockVersion, current, type, adopt } = useTypedContent(draft);
  const [save, setSave] = useState<SaveState>({ state: "saved", at: draft.savedAt });

  const setContent = useCallback(
    (change: (content: DraftContent) => DraftContent) => {
      type(change(current().content));
      setSave((now) => (now.state === "moved" ? now : { state: "waiting" }));
    },
    [current, type],
  );

  const send = useCallback(async () => {
    const sent = current();
    const { productCode, proposalId } = draft;
    setSave({ state: "saving" });
    const answer = await putDraft({ productCode, proposalId, ...sent });
    if (answer.state === "stored") {
      adopt(answer.lockVersion);
      if (current().content !== sent.content) return setSave({ state: "waiting" });
      dropBackup(draft.proposalId);
      return setSave({ state: "saved", at: answer.at });
    }
    setSave(answer);
  }, [adopt, current, draft]);

  useSending(save, send);

  const takeUp = useCallback(
    (kept: Backup) => {
      adopt(kept.lockVersion);
      setContent(() => kept.content);
    },
    [adopt, setContent],
  );
  useKeptBackup(draft, takeUp);

  const settle = useCallback(
    (whose: "mine" | "theirs", stored: DraftView) => {
      adopt(stored.lockVersion);
      if (whose === "theirs") {
        type(stored.content);
        dropBackup(draft.proposalId);
        setSave({ state: "saved", at: stored.savedAt });
      } else setSave({ state: "waiting" });
    },
    [adopt, draft.proposalId, type],
  );

  return { content, setContent, save, lockVersion, settle, saveNow: send };
}

/**
 * What a lost connection or a sign-out left on this device is taken up again, on the saved state that it was typed on:
 * what a co-editor saved meanwhile is shown, not overwritten.
 */
function useKeptBackup(draft: DraftView, takeUp: (kept: Backup) => void): void {
  useEffect(() => {
    const kept = readBackup(draft.proposalId);
    if (!kept) return;
    // The server had it, only its answer was lost.
    if (sameValue(kept.content, draft.content)) return dropBackup(draft.proposalId);
    takeUp(kept);
  }, [draft, takeUp]);
}

/** Sends a moment after the last keystroke, and again after what may pass. */
function useSending(save: SaveState, send: () => Promise<void>): void {
  useEffect(() => {
    if (save.state !== "waiting" && !(save.state === "failed" && save.triesAgain)) return;
    const timer = setTimeout(() => void send(), save.state === "waiting" ? PAUSE_MS : RETRY_MS);
    return () => clearTimeout(timer);
  }, [save, send]);
}
