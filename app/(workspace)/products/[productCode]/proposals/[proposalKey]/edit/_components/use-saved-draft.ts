"use client";

import { useCallback, useEffect, useRef, useState } from "react";

import { type DraftAnswer, putDraft } from "@/app/(workspace)/_drafts/put-draft";
import { asStored, mergeDrafts } from "@/lib/proposals/drafting/merge-drafts";
import { sameValue } from "@/lib/proposals/records/same-value";
import type { DraftContent } from "@/lib/proposals/schema";
import type { DraftView } from "@/lib/proposals/workspace-views";

import { type Backup, dropBackup, keepBackup, readBackup } from "./draft-backup";

export type SaveState =
  | { state: "saved"; at: string }
  | { state: "waiting" }
  | { state: "saving" }
  /** What was typed is kept on this device. */
  | Extract<DraftAnswer, { state: "failed" }>
  /** A co-editor changed a field that is changed here too, since both had the base. */
  | (Extract<DraftAnswer, { state: "moved" }> & { base: DraftContent });

const PAUSE_MS = 700;
const RETRY_MS = 5000;

/** What is typed and the saved state that it stands on, both kept on this device as well. */
function useTypedContent({ proposalId, ...draft }: DraftView) {
  const [content, setContent] = useState<DraftContent>(draft.content);
  const [lockVersion, setLockVersion] = useState(draft.lockVersion);
  const newest = useRef<Backup>({ lockVersion, base: asStored(content), content });

  const keep = useCallback(
    (change: Partial<Backup>) => {
      newest.current = { ...newest.current, ...change };
      keepBackup(proposalId, newest.current);
      setContent(newest.current.content);
      setLockVersion(newest.current.lockVersion);
    },
    [proposalId],
  );
  const current = useCallback(() => newest.current, []);

  return { content, lockVersion, current, keep };
}

/** Keeps a draft: on the server a moment after the last keystroke, and on this device until the server has it. */
export function useSavedDraft(draft: DraftView) {
  const { content, lockVersion, current, keep } = useTypedContent(draft);
  const [save, setSave] = useState<SaveState>({ state: "saved", at: draft.savedAt });
  const [touched, setTouched] = useState(draft.touched);
  const [touchedElsewhere, setTouchedElsewhere] = useState(draft.touchedElsewhere);
  const sent = useRef<DraftContent[]>([]);

  const setContent = useCallback(
    (change: (content: DraftContent) => DraftContent) => {
      keep({ content: change(current().content) });
      setSave((now) => (now.state === "moved" ? now : { state: "waiting" }));
    },
    [current, keep],
  );

  /** Goes on from what a co-editor stored, with what came of both. */
  const settle = useCallback(
    (merged: DraftContent, stored: DraftView) => {
      setTouched(stored.touched);
      setTouchedElsewhere(stored.touchedElsewhere);
      keep({ lockVersion: stored.lockVersion, base: stored.content, content: merged });
      setSave({ state: "waiting" });
    },
    [keep],
  );

  const send = useCallback(async () => {
    const { lockVersion: onto, content: typed } = current();
    setSave({ state: "saving" });
    sent.current.push(asStored(typed));
    const { productCode, proposalId } = draft;
    const answer = await putDraft({ productCode, proposalId, lockVersion: onto, content: typed });
    if (answer.state === "failed") return setSave(answer);
    if (answer.state === "moved") {
      const base = baseOf(answer.stored, sent.current, current().base);
      const merge = mergeDrafts(base, answer.stored.content, asStored(current().content), new Map());
      return merge.conflicts.length > 0 ? setSave({ ...answer, base }) : settle(merge.content, answer.stored);
    }
    sent.current = [];
    setTouchedElsewhere(answer.touchedElsewhere);
    keep({ lockVersion: answer.lockVersion, base: asStored(typed) });
    if (current().content !== typed) return setSave({ state: "waiting" });
    dropBackup(proposalId);
    return setSave({ state: "saved", at: answer.at });
  }, [current, draft, keep, settle]);

  useSending(save, send);
  useKeptBackup(draft, keep, setSave);

  return { content, setContent, save, lockVersion, settle, touched, touchedElsewhere };
}

/** A save whose answer was lost is no change of somebody else's: what is stored then is what was sent. */
function baseOf(stored: DraftView, sent: readonly DraftContent[], base: DraftContent): DraftContent {
  return sent.find((each) => sameValue(each, stored.content)) ?? base;
}

/**
 * What a lost connection or a sign-out left on this device is taken up again, on the saved state that it was typed on:
 * what a co-editor saved meanwhile is shown, not overwritten.
 */
function useKeptBackup(draft: DraftView, keep: (kept: Backup) => void, setSave: (save: SaveState) => void): void {
  useEffect(() => {
    const kept = readBackup(draft.proposalId);
    if (!kept) return;
    // The server had it, only its answer was lost.
    if (sameValue(kept.content, draft.content)) return dropBackup(draft.proposalId);
    keep(kept);
    setSave({ state: "waiting" });
  }, [draft, keep, setSave]);
}

/** Sends a moment after the last keystroke, and again after what may pass. */
function useSending(save: SaveState, send: () => Promise<void>): void {
  useEffect(() => {
    if (save.state !== "waiting" && !(save.state === "failed" && save.triesAgain)) return;
    const timer = setTimeout(() => void send(), save.state === "waiting" ? PAUSE_MS : RETRY_MS);
    return () => clearTimeout(timer);
  }, [save, send]);
}
