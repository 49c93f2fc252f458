"use client";

import type { Route } from "next";
import { useRouter } from "next/navigation";
import { useRef, useState } from "react";

import { startDraftAction } from "@/app/(workspace)/_drafts/actions";
import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { TextField } from "@/app/_components/text-field";

/** Asks for a title and goes on to the editor. */
export function StartDraft({ productCode }: { productCode: string }) {
  const router = useRouter();
  const draftId = useRef<number | null>(null);
  const [key, setKey] = useState(() => crypto.randomUUID());

  return (
    <ConfirmDialog
      trigger="Start a draft…"
      triggerKind="primary"
      title="Start a draft"
      confirm="Start"
      onConfirm={async (form) => {
        const answer = await startDraftAction({ productCode, title: String(form.get("title") ?? ""), key });
        if (answer.ok) draftId.current = answer.value.proposalId;
        return answer;
      }}
      onDone={() => {
        setKey(crypto.randomUUID());
        router.push(`/products/${productCode}/proposals/draft-${draftId.current}/edit` as Route);
      }}
    >
      {(faultOf) => (
        <>
          <TextField
            name="title"
            label="Title"
            hint="What changes, in a few words: Smoother finish on the rear panels."
            error={faultOf("title")}
            maxLength={120}
            required
            autoComplete="off"
          />
          <p className="text-sm text-ink-2">
            Whoever edits a proposal can’t sign it, in any capacity. A draft is seen by you and those you name.
          </p>
        </>
      )}
    </ConfirmDialog>
  );
}
