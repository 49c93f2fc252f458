"use client";

import { ChoiceField } from "@/app/_components/choice-field";
import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import type { PersonView } from "@/lib/proposals/views";
import type { DraftView } from "@/lib/proposals/workspace-views";

import { shareDraftAction, unshareDraftAction } from "../actions";

interface CoEditorsProps {
  draft: DraftView;
  /** Only the proposer names co-editors and ends their part. */
  isProposer: boolean;
}

/** Who edits along; naming one is an act, and bars them from signing. */
export function CoEditors({ draft, isProposer }: CoEditorsProps) {
  const { proposalId, proposer, coEditors, couldCoEdit } = draft;

  return (
    <div className="mt-6">
      <h2 className="text-lg">Editors</h2>
      <ul className="my-1 space-y-1">
        <li>{proposer.name}</li>
        {coEditors.map((person) => (
          <li key={person.id} className="flex flex-wrap items-baseline gap-x-3">
            {person.name}
            {isProposer ? <EndSharing proposalId={proposalId} person={person} /> : null}
          </li>
        ))}
      </ul>
      {isProposer && couldCoEdit.length > 0 ? (
        <ConfirmDialog
          trigger="Name a co-editor…"
          title="Name a co-editor"
          confirm="Name"
          onConfirm={(form) => shareDraftAction({ proposalId, userId: Number(form.get("userId") ?? 0) })}
        >
          {(faultOf) => (
            <ChoiceField
              name="userId"
              label="Co-editor"
              hint="Sees and edits this draft from now on, and can never sign it once they edited it."
              choices={couldCoEdit.map(({ id, name }) => ({ value: String(id), label: name }))}
              error={faultOf("userId")}
            />
          )}
        </ConfirmDialog>
      ) : null}
    </div>
  );
}

function EndSharing({ proposalId, person }: { proposalId: number; person: PersonView }) {
  return (
    <ConfirmDialog
      trigger="End…"
      title={`End the part of ${person.name}`}
      confirm="End it"
      confirmKind="refuse"
      onConfirm={() => unshareDraftAction({ proposalId, userId: person.id })}
    >
      <p>{person.name} no longer edits this proposal. What they changed stays, and who edited it can never sign it.</p>
    </ConfirmDialog>
  );
}
