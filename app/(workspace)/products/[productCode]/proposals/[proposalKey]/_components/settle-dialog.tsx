"use client";

import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { TextArea } from "@/app/_components/text-area";

import { settleRemarkAction } from "../actions";

export function SettleDialog({ remarkId, number }: { remarkId: number; number: number }) {
  return (
    <ConfirmDialog
      trigger="Settle…"
      title={`Settle remark ${number}`}
      confirm="Settle"
      onConfirm={(form) => settleRemarkAction({ remarkId, reason: String(form.get("reason") ?? "") })}
    >
      {(faultOf) => (
        <TextArea
          name="reason"
          label="How it was settled"
          rows={3}
          maxLength={500}
          error={faultOf("reason")}
          required
        />
      )}
    </ConfirmDialog>
  );
}
