"use client";

import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { TextArea } from "@/app/_components/text-area";

import { voidFileAction } from "./actions";

/** Marks a file as not to be relied on. Nothing is deleted, and nothing takes it back. */
export function VoidFileDialog({ fileId, name }: { fileId: number; name: string }) {
  return (
    <ConfirmDialog
      trigger="Void…"
      title={`Void ${name}`}
      confirm="Void the file"
      confirmKind="refuse"
      onConfirm={(form) => voidFileAction({ fileId, reason: String(form.get("reason") ?? "") })}
    >
      {(faultOf) => (
        <>
          <p>
            The file stays and can still be opened; wherever it is cited, it is shown as voided from now on. This can’t
            be taken back.
          </p>
          <TextArea
            name="reason"
            label="Why nobody should rely on it"
            maxLength={500}
            error={faultOf("reason")}
            required
          />
        </>
      )}
    </ConfirmDialog>
  );
}
