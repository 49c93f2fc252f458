"use client";

import { useRouter } from "next/navigation";
import { type FormEvent, type ReactNode, type RefObject, useRef, useState } from "react";
import { flushSync } from "react-dom";
import { useSWRConfig } from "swr";

import type { ActionResult } from "../_server/action-result";
import { answerOf } from "./answer-of";
import { Button, type ButtonKind } from "./button";
import { ModalSheet } from "./modal-sheet";
import { Notice } from "./notice";
import { WAITING_ADDRESS } from "./waiting-address";

/** Looks up the sentence at a field. */
export type FaultOf = (path: string) => string | undefined;

interface ConfirmDialogProps {
  /** Text of the button that opens the dialog; ends in an ellipsis. */
  trigger: string;
  triggerKind?: ButtonKind;
  disabled?: boolean;
  title: string;
  /** Text of the button that acts: "Sign". */
  confirm: string;
  confirmKind?: ButtonKind;
  /** While what the dialog asks about is still being read. */
  confirmDisabled?: boolean;
  /** What is agreed to, and the fields that are asked. */
  children: ReactNode | ((faultOf: FaultOf) => ReactNode);
  onConfirm: (form: FormData) => Promise<ActionResult<unknown>>;
  /** After success; without it the page is read again. */
  onDone?: () => void;
}

/** Asks once more before an act: native dialog, its own form, refusals shown inside it. */
export function ConfirmDialog(props: ConfirmDialogProps) {
  const { trigger, triggerKind, disabled, title, confirm, confirmKind = "primary", confirmDisabled, children } = props;
  const dialog = useRef<HTMLDialogElement>(null);
  const { opened, open, busy, answer, submit, clear } = useConfirmation(dialog, props);
  const refused = answer && !answer.ok ? answer : null;
  const faultOf: FaultOf = (path) => refused?.faults.find((fault) => fault.path === path)?.sentence;

  return (
    <>
      <Button kind={triggerKind} disabled={disabled} aria-haspopup="dialog" onClick={open}>
        {trigger}
      </Button>
      <ModalSheet dialog={dialog} title={title} onClose={clear}>
        {opened ? (
          <form onSubmit={submit} className="space-y-4">
            {typeof children === "function" ? children(faultOf) : children}
            {refused ? <Notice kind="refusal">{refused.sentence}</Notice> : null}
            <div className="flex flex-wrap gap-2">
              <Button type="submit" kind={confirmKind} busy={busy} disabled={confirmDisabled}>
                {busy ? "One moment…" : confirm}
              </Button>
              <Button onClick={() => dialog.current?.close()}>Cancel</Button>
            </div>
          </form>
        ) : null}
      </ModalSheet>
    </>
  );
}

function useConfirmation(
  dialog: RefObject<HTMLDialogElement | null>,
  { onConfirm, onDone }: Pick<ConfirmDialogProps, "onConfirm" | "onDone">,
) {
  const router = useRouter();
  const { mutate } = useSWRConfig();
  const [opened, setOpened] = useState(false);
  const [busy, setBusy] = useState(false);
  const [answer, setAnswer] = useState<ActionResult<unknown> | null>(null);

  function open() {
    // The content has to be there when the dialog looks for what to focus.
    flushSync(() => setOpened(true));
    dialog.current?.showModal();
  }

  // Closed unfinished, it keeps what was typed, but no password.
  function clear() {
    setAnswer(null);
    for (const field of dialog.current?.querySelectorAll<HTMLInputElement>("input[type=password]") ?? []) {
      field.value = "";
    }
  }

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    if (busy) return;
    setBusy(true);
    try {
      const result = await answerOf(onConfirm(new FormData(event.currentTarget)));
      setAnswer(result);
      if (!result.ok) return;
      dialog.current?.close();
      setOpened(false);
      void mutate(WAITING_ADDRESS);
      if (onDone) onDone();
      else router.refresh();
    } finally {
      setBusy(false);
    }
  }

  return { opened, open, busy, answer, submit, clear };
}
