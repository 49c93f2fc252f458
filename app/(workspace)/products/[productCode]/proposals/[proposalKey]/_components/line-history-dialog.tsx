"use client";

import { useRef, useState } from "react";

import { answerOf } from "@/app/_components/answer-of";
import { Button } from "@/app/_components/button";
import { ModalSheet } from "@/app/_components/modal-sheet";
import { Notice } from "@/app/_components/notice";
import type { LineRevisionView } from "@/lib/budget/views";
import type { LineReference } from "@/lib/proposals/views";

import { RevisionsTable } from "@/app/(workspace)/products/[productCode]/_components/revisions-table";
import { openLineHistoryAction } from "../actions";

interface LineHistoryDialogProps {
  productCode: string;
  proposalId: number;
  line: LineReference;
}

type Shown = { revisions: readonly LineRevisionView[] } | { sentence: string } | null;

/** Every letter of an edited line with date, who and why, fetched when it is opened: that it was is noted. */
export function LineHistoryDialog({ productCode, proposalId, line }: LineHistoryDialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const [shown, setShown] = useState<Shown>(null);
  const { kind, number, name } = line;
  const title = `Change history of ${number} ${name}`;

  async function open() {
    dialog.current?.showModal();
    const answer = await answerOf(openLineHistoryAction({ proposalId, kind, number }));
    setShown(answer.ok ? { revisions: answer.value } : { sentence: answer.sentence });
  }

  return (
    <>
      <Button aria-haspopup="dialog" onClick={() => void open()}>
        {title}…
      </Button>
      <ModalSheet dialog={dialog} title={title}>
        {shown === null ? <p role="status">Being fetched…</p> : null}
        {shown && "sentence" in shown ? <Notice kind="refusal">{shown.sentence}</Notice> : null}
        {shown && "revisions" in shown ? (
          <RevisionsTable revisions={shown.revisions} productCode={productCode} />
        ) : null}
      </ModalSheet>
    </>
  );
}
