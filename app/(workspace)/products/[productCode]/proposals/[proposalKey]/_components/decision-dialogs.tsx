"use client";

import { useRouter } from "next/navigation";
import { useState } from "react";

import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { TextArea } from "@/app/_components/text-area";
import { TextField } from "@/app/_components/text-field";
import type { SigningSheetView } from "@/lib/proposals/views";
import type { Capacity } from "@/lib/vocabulary/roles";

import {
  raiseObjectionAction,
  returnProposalAction,
  signProposalAction,
  takeBackApprovalAction,
  withdrawProposalAction,
} from "../actions";
import { SignedText } from "./signed-text";

interface ReturnDialogProps {
  proposalId: number;
  roundHash: string;
  capacity: Capacity;
}

export function ReturnDialog({ proposalId, roundHash, capacity }: ReturnDialogProps) {
  return (
    <ConfirmDialog
      trigger="Return for rework…"
      title="Return for rework"
      confirm="Return"
      onConfirm={(form) => returnProposalAction({ proposalId, roundHash, capacity, reason: textOf(form, "reason") })}
    >
      {(faultOf) => (
        <TextArea
          name="reason"
          label="What has to be done before it can be approved"
          maxLength={2000}
          error={faultOf("reason")}
          required
        />
      )}
    </ConfirmDialog>
  );
}

interface DisapproveDialogProps {
  proposalId: number;
  label: string;
  sheet: SigningSheetView;
  deputyForId: number | null;
}

export function DisapproveDialog({ proposalId, label, sheet, deputyForId }: DisapproveDialogProps) {
  const router = useRouter();

  return (
    <ConfirmDialog
      trigger="Disapprove…"
      triggerKind="refuse"
      title={`Disapprove ${label}`}
      confirm="Disapprove"
      confirmKind="refuse"
      onConfirm={async (form) => {
        const answer = await signProposalAction({
          proposalId,
          roundHash: sheet.roundHash,
          textHash: sheet.textHash,
          decision: "disapprove",
          capacity: "program_manager",
          reason: textOf(form, "reason"),
          deputyForId,
          password: textOf(form, "password"),
        });
        if (!answer.ok && answer.code === "moved") router.refresh();
        return answer;
      }}
    >
      {(faultOf) => (
        <>
          <p>A disapproved proposal is closed for good; the same change needs a new one.</p>
          <SignedText sheet={sheet} />
          <TextArea name="reason" label="Why" maxLength={2000} error={faultOf("reason")} required />
          <TextField
            name="password"
            type="password"
            label="Your password"
            autoComplete="current-password"
            error={faultOf("password")}
            required
          />
        </>
      )}
    </ConfirmDialog>
  );
}

export function TakeBackDialog({ proposalId }: { proposalId: number }) {
  return (
    <ConfirmDialog
      trigger="Take back your approval…"
      title="Take back your approval"
      confirm="Take back"
      onConfirm={(form) => takeBackApprovalAction({ proposalId, reason: textOf(form, "reason") })}
    >
      {(faultOf) => <TextArea name="reason" label="Why" rows={3} maxLength={500} error={faultOf("reason")} required />}
    </ConfirmDialog>
  );
}

export function WithdrawDialog({ proposalId, label }: { proposalId: number; label: string }) {
  return (
    <ConfirmDialog
      trigger="Withdraw…"
      title={`Withdraw ${label}`}
      confirm="Withdraw"
      confirmKind="refuse"
      onConfirm={(form) => withdrawProposalAction({ proposalId, reason: textOf(form, "reason") })}
    >
      {(faultOf) => (
        <>
          <p>It keeps its number and stays readable; it can’t be taken up again.</p>
          <TextArea name="reason" label="Why" rows={3} maxLength={500} error={faultOf("reason")} required />
        </>
      )}
    </ConfirmDialog>
  );
}

export function ObjectDialog({ proposalId }: { proposalId: number }) {
  const [key, setKey] = useState(() => crypto.randomUUID());

  return (
    <ConfirmDialog
      trigger="Object…"
      title="Object"
      confirm="Object"
      onConfirm={async (form) => {
        const answer = await raiseObjectionAction({ proposalId, reason: textOf(form, "reason"), key });
        if (answer.ok) setKey(crypto.randomUUID());
        return answer;
      }}
    >
      {(faultOf) => (
        <>
          <p>An objection is shown to all who sign. It moves nothing by itself.</p>
          <TextArea name="reason" label="Why you object" maxLength={2000} error={faultOf("reason")} required />
        </>
      )}
    </ConfirmDialog>
  );
}

function textOf(form: FormData, name: string): string {
  return String(form.get(name) ?? "");
}
