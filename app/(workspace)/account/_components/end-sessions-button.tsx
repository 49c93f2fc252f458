"use client";

import { ConfirmDialog } from "@/app/_components/confirm-dialog";
import { loadAnew } from "@/app/_components/load-anew";

import { endSessionsAction } from "../actions";

export function EndSessionsButton() {
  return (
    <ConfirmDialog
      trigger="Sign out everywhere…"
      title="Sign out everywhere"
      confirm="Sign out everywhere"
      onConfirm={() => endSessionsAction({})}
      onDone={() => loadAnew("/sign-in")}
    >
      <p>Every session of yours ends, this one too. What you typed and did not save elsewhere is lost there.</p>
    </ConfirmDialog>
  );
}
