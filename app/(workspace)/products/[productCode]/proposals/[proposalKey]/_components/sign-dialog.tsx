"use client";

import { useRouter } from "next/navigation";

import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { Notice } from "@/app/_components/notice";
import { RadioField } from "@/app/_components/radio-field";
import { ChoiceField } from "@/app/_components/choice-field";
import { TextField } from "@/app/_components/text-field";
import type { PersonView, SigningSheetView } from "@/lib/proposals/views";
import { SIGNATURE_MEANINGS } from "@/lib/vocabulary/proposals";
import { type Capacity, ROLE_NAMES } from "@/lib/vocabulary/roles";

import { signProposalAction } from "../actions";
import { SignedText } from "./signed-text";

interface SignDialogProps {
  proposalId: number;
  label: string;
  capacity: Capacity;
  sheet: SigningSheetView;
  /** Signing for one of these as their deputy; empty where the signer acts in their own right. */
  deputyFor: readonly PersonView[];
  ownRight: boolean;
}

/** Signs with the password: the text that is signed is shown whole, and its hash goes along. */
export function SignDialog({ proposalId, label, capacity, sheet, deputyFor, ownRight }: SignDialogProps) {
  const router = useRouter();
  const meanings = SIGNATURE_MEANINGS[capacity];

  return (
    <ConfirmDialog
      trigger={`Sign as ${ROLE_NAMES[capacity].toLowerCase()}…`}
      triggerKind="primary"
      title={`Sign ${label} as ${ROLE_NAMES[capacity].toLowerCase()}`}
      confirm="Sign"
      onConfirm={async (form) => {
        const deputy = Number(form.get("deputyFor") ?? 0);
        const answer = await signProposalAction({
          proposalId,
          roundHash: sheet.roundHash,
          textHash: sheet.textHash,
          decision: "approve",
          capacity,
          meaning: String(form.get("meaning") ?? ""),
          deputyForId: deputy > 0 ? deputy : null,
          password: String(form.get("password") ?? ""),
        });
        // What moved meanwhile is shown again before anybody signs it.
        if (!answer.ok && answer.code === "moved") router.refresh();
        return answer;
      }}
    >
      {(faultOf) => (
        <>
          <SignedText sheet={sheet} />
          <RadioField
            name="meaning"
            label="Your signature means"
            choices={meanings.map((meaning) => ({ value: meaning, label: meaning }))}
            defaultValue={meanings[0]}
            error={faultOf("meaning")}
          />
          {deputyFor.length > 0 ? (
            <ChoiceField
              name="deputyFor"
              label="You sign"
              choices={[
                ...(ownRight ? [{ value: "0", label: "in your own right" }] : []),
                ...deputyFor.map(({ id, name }) => ({ value: String(id), label: `as deputy for ${name}` })),
              ]}
              error={faultOf("deputyForId")}
            />
          ) : null}
          <TextField
            name="password"
            type="password"
            label="Your password"
            autoComplete="current-password"
            error={faultOf("password")}
            required
          />
          <Notice>Your name, the time in UTC and the hash of the text above are kept with the signature.</Notice>
        </>
      )}
    </ConfirmDialog>
  );
}
