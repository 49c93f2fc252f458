"use client";

import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import type { DeputyView } from "@/lib/products/queries";

import { endDeputyAction } from "../actions";

export function EndDeputy({ deputy: { deputyshipId, deputy } }: { deputy: DeputyView }) {
  return (
    <ConfirmDialog
      trigger="End…"
      title={`End ${deputy.name} as your deputy`}
      confirm="End it"
      confirmKind="refuse"
      onConfirm={() => endDeputyAction({ deputyshipId })}
    >
      <p>{deputy.name} signs nothing more for you from now on. What they signed stays.</p>
    </ConfirmDialog>
  );
}
