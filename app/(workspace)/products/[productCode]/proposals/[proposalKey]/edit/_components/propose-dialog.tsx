"use client";

import type { Route } from "next";
import { useRouter } from "next/navigation";
import { useRef, useState } from "react";

import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { TextField } from "@/app/_components/text-field";
import type { ProposalPreview } from "@/lib/proposals/review/preview-proposal";
import type { DraftView } from "@/lib/proposals/workspace-views";

import { proposeAction } from "../actions";
import { RoutingPanel } from "./routing-panel";

interface ProposeDialogProps {
  draft: DraftView;
  lockVersion: number;
  preview: ProposalPreview;
  disabled: boolean;
}

/** Submits the draft as a round; asks for the password where submitting signs a capacity. */
export function ProposeDialog({ draft, lockVersion, preview, disabled }: ProposeDialogProps) {
  const router = useRouter();
  const [key] = useState(() => crypto.randomUUID());
  const number = useRef<number | null>(null);
  const signs = preview.routing.some(({ signedBySubmitting }) => signedBySubmitting);

  return (
    <ConfirmDialog
      trigger="Propose…"
      triggerKind="primary"
      disabled={disabled}
      title="Propose this change"
      confirm="Propose"
      onConfirm={async (form) => {
        const password = signs ? String(form.get("password") ?? "") : null;
        const answer = await proposeAction({ proposalId: draft.proposalId, lockVersion, key, password });
        if (answer.ok) number.current = answer.value.number;
        return answer;
      }}
      onDone={() => router.push(`/products/${draft.productCode}/proposals/${number.current}` as Route)}
    >
      {(faultOf) => (
        <>
          <p>It becomes a round that stays as it is. Those who must sign are told by e-mail.</p>
          <RoutingPanel preview={preview} />
          {signs ? (
            <TextField
              name="password"
              type="password"
              label="Your password"
              autoComplete="current-password"
              error={faultOf("password")}
              required
            />
          ) : null}
        </>
      )}
    </ConfirmDialog>
  );
}
