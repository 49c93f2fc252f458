"use client";

import { ChoiceField } from "@/app/_components/choice-field";
import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { TextField } from "@/app/_components/text-field";
import type { ProposalView } from "@/lib/proposals/views";

import { nameReviewerAction } from "../actions";

/** Names the one reviewer who fills that capacity, or opens it to all again. */
export function NameReviewer({ proposal }: { proposal: ProposalView }) {
  const capacity = proposal.routing?.capacities.find((one) => one.capacity === "reviewer");
  if (!capacity) return null;

  return (
    <ConfirmDialog
      trigger={capacity.named ? "Name another reviewer…" : "Name the reviewer…"}
      title={capacity.named ? `Name another reviewer than ${capacity.named.name}` : "Name the reviewer"}
      confirm="Name"
      onConfirm={(form) => {
        const chosen = Number(form.get("userId") ?? 0);
        return nameReviewerAction({
          proposalId: proposal.proposalId,
          userId: chosen > 0 ? chosen : null,
          reason: String(form.get("reason") ?? ""),
        });
      }}
    >
      {(faultOf) => (
        <>
          <ChoiceField
            name="userId"
            label="Only this reviewer fills the capacity"
            hint="A return stays open to every reviewer."
            defaultValue={String(capacity.named?.id ?? 0)}
            choices={[
              { value: "0", label: "any reviewer who is free to sign" },
              ...capacity.couldName.map(({ id, name }) => ({ value: String(id), label: name })),
            ]}
            error={faultOf("userId")}
          />
          {capacity.named ? (
            <TextField
              name="reason"
              label={`Why no longer ${capacity.named.name}`}
              hint="For example: away until 12 May. It stands on the sheet and in the history."
              maxLength={500}
              autoComplete="off"
              error={faultOf("reason")}
              required
            />
          ) : null}
        </>
      )}
    </ConfirmDialog>
  );
}
