"use client";

import { ChoiceField } from "@/app/_components/choice-field";
import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import type { DraftView } from "@/lib/proposals/workspace-views";

import { shareDraftAction } from "../actions";

/** Who edits along; naming one is an act, and bars them from signing. */
export function CoEditors({ draft }: { draft: DraftView }) {
  return (
    <div className="mt-6">
      <h2 className="text-lg">Editors</h2>
      <p className="my-1">{[draft.proposer, ...draft.coEditors].map(({ name }) => name).join(", ")}</p>
      {draft.couldCoEdit.length > 0 ? (
        <ConfirmDialog
          trigger="Name a co-editor…"
          title="Name a co-editor"
          confirm="Name"
          onConfirm={(form) =>
            shareDraftAction({ proposalId: draft.proposalId, userId: Number(form.get("userId") ?? 0) })
          }
        >
          {(faultOf) => (
            <ChoiceField
              name="userId"
              label="Co-editor"
              hint="Sees and edits this draft from now on, and can never sign it."
              choices={draft.couldCoEdit.map(({ id, name }) => ({ value: String(id), label: name }))}
              error={faultOf("userId")}
            />
          )}
        </ConfirmDialog>
      ) : null}
    </div>
  );
}
