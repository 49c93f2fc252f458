"use client";

import { useCallback, useEffect, useRef, useState } from "react";

import type { SavedDraft } from "@/lib/proposals/save-draft";
import type { DraftContent } from "@/lib/proposals/schema";
import type { DraftView } from "@/lib/proposals/workspace-views";

import { dropBackup, keepBackup, readBackup } from "./draft-backup";

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

/** Keeps a draft: on the server a moment after the last keystroke, and on this device until the server has it. */
export function useSavedDraft(draft: DraftView) {
  const [content, setContentState] = useState<DraftContent>(draft.content);
  const [save, setSave] = useState<SaveState>({ state: "saved", at: draft.savedAt });
  const [lockVersion, setLockVersion] = useState(draft.lockVersion);
  const newest = useRef(content);
  const lock = useRef(lockVersion);

  const setContent = useCallback(
    (change: (content: DraftContent) => DraftContent) => {
      const next = change(newest.current);
      newest.current = next;
      keepBackup(draft.proposalId, next);
      setContentState(next);
      setSave((now) => (now.state === "moved" ? now : { state: "waiting" }));
    },
    [draft.proposalId],
  );

  const adopt = useCallback((version: number) => {
    lock.current = version;
    setLockVersion(version);
  }, []);

  const send = useCallback(async () => {
    const sent = newest.current;
    setSave({ state: "saving" });
    const answer = await putDraft(draft, lock.current, sent);
    if (answer.state === "stored") {
      adopt(answer.lockVersion);
      if (newest.current !== sent) return setSave({ state: "waiting" });
      dropBackup(draft.proposalId);
      return setSave({ state: "saved", at: answer.at });
    }
    setSave(answer);
  }, [adopt, draft]);

  useEffect(() => {
    if (save.state !== "waiting" && !(save.state === "failed" && save.triesAgain)) return;
    const timer = setTimeout(() => void send(), save.state === "waiting" ? PAUSE_MS : RETRY_MS);
    return () => clearTimeout(timer);
  }, [save, send]);

  // What a lost connection or a sign-out left on this device is taken up again.
  useEffect(() => {
    const kept = readBackup(draft.proposalId);
    if (kept) setContent(() => kept);
  }, [draft.proposalId, setContent]);

  const settle = useCallback(
    (whose: "mine" | "theirs", stored: DraftView) => {
      adopt(stored.lockVersion);
      if (whose === "theirs") {
        newest.current = stored.content;
        dropBackup(draft.proposalId);
        setContentState(stored.content);
        setSave({ state: "saved", at: stored.savedAt });
      } else setSave({ state: "waiting" });
    },
    [adopt, draft.proposalId],
  );

  return { content, setContent, save, lockVersion, settle, saveNow: send };
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
