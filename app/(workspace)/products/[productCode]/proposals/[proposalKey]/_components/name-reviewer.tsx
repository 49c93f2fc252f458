"use client";

import { ChoiceField } from "@/app/_components/choice-field";
import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import type { ProposalView } from "@/lib/proposals/views";

import { nameReviewerAction } from "../actions";

/** Names the one reviewer who fills that capacity, or opens it to all again. */
export function NameReviewer({ proposal }: { proposal: ProposalView }) {
  const capacity = proposal.routing?.capacities.find((one) => one.capacity === "reviewer");
  if (!capacity) return null;

  return (
    <ConfirmDialog
      trigger="Name the reviewer…"
      title="Name the reviewer"
      confirm="Name"
      onConfirm={(form) => {
        const chosen = Number(form.get("userId") ?? 0);
        return nameReviewerAction({ proposalId: proposal.proposalId, userId: chosen > 0 ? chosen : null });
      }}
    >
      {(faultOf) => (
        <ChoiceField
          name="userId"
          label="Only this reviewer fills the capacity"
          hint="A return stays open to every reviewer."
          defaultValue={String(capacity.named?.id ?? 0)}
          choices={[
            { value: "0", label: "any reviewer who is free to sign" },
            ...capacity.maySign.map(({ id, name }) => ({ value: String(id), label: name })),
          ]}
          error={faultOf("userId")}
        />
      )}
    </ConfirmDialog>
  );
}
