"use client";

import { useCallback, useEffect, useRef, useState } from "react";

import { sameValue } from "@/lib/proposals/same-value";
import type { SavedDraft } from "@/lib/proposals/save-draft";
import type { DraftContent } from "@/lib/proposals/schema";
import type { DraftView } from "@/lib/proposals/workspace-views";

import { type Backup, dropBackup, keepBackup, readBackup } from "./draft-backup";

export type SaveState =
  | { state: "saved"; at: string }
  | { state: "waiting" }
  | { state: "saving" }
  /** Not saved, with the sentence why; what was typed is kept on this device. */
  | { state: "failed"; sentence: string; faults: readonly { path: string; sentence: string }[]; triesAgain: boolean }
  /** Somebody else saved meanwhile. */
  | { state: "moved"; stored: DraftView };

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
    setSave({ state: "saving" });
    const answer = await putDraft(draft, sent.lockVersion, sent.content);
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

type Answer = { state: "stored"; lockVersion: number; at: string } | Extract<SaveState, { state: "failed" | "moved" }>;

async function putDraft(draft: DraftView, lockVersion: number, content: DraftContent): Promise<Answer> {
  let response: Response;
  try {
    response = await fetch(`/api/products/${draft.productCode}/drafts/${draft.proposalId}`, {
      method: "PUT",
      headers: { "content-type": "application/json" },
      body: JSON.stringify({ proposalId: draft.proposalId, lockVersion, content }),
    });
  } catch {
    return { state: "failed", sentence: "no connection to the server", faults: [], triesAgain: true };
  }
  const answer: SavedDraft | Problem = await response.json();
  if ("outcome" in answer) {
    return answer.outcome === "saved"
      ? { state: "stored", lockVersion: answer.lockVersion, at: answer.savedAt }
      : { state: "moved", stored: answer.stored };
  }

  // What is refused as it stands is refused again: only a sign-out or a fault of the server may pass.
  const triesAgain = response.status === 401 || response.status >= 500;
  return { state: "failed", sentence: answer.sentence, faults: answer.faults, triesAgain };
}

interface Problem {
  sentence: string;
  faults: { path: string; sentence: string }[];
}
