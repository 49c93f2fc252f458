"use client";

import { useRouter } from "next/navigation";
import { type FormEvent, useId, useRef, useState, useTransition } from "react";

import type { AddRemarkInput } from "@/lib/proposals/schema";
import type { PersonView } from "@/lib/proposals/views";
import { Button } from "@/app/_components/button";
import { CheckField } from "@/app/_components/check-field";
import { MarkdownEditor } from "@/app/_components/markdown-editor";
import { ModalSheet } from "@/app/_components/modal-sheet";
import { Notice } from "@/app/_components/notice";
import { TextField } from "@/app/_components/text-field";

import { addRemarkAction } from "../actions";

interface RemarkDialogProps {
  proposalId: number;
  /** What the remark is about; without it, the proposal as a whole. */
  target?: Pick<AddRemarkInput, "line" | "field">;
  /** The remark that this one answers. */
  parentId?: number;
  title: string;
  trigger?: string;
  /** To whom it can be addressed. */
  people: readonly PersonView[];
  /** Drawn as a plain word in a table row. */
  discreet?: boolean;
}

/** Writes a remark or an answer. What was typed stays until it is sent, also when the dialog is closed. */
export function RemarkDialog({ trigger = "Remark…", title, discreet = false, ...about }: RemarkDialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const [opened, setOpened] = useState(false);
  const open = () => {
    setOpened(true);
    dialog.current?.showModal();
  };

  return (
    <>
      {discreet ? (
        <button
          type="button"
          aria-haspopup="dialog"
          aria-label={title}
          className="link min-h-6 text-xs print:hidden"
          onClick={open}
        >
          {trigger}
        </button>
      ) : (
        <Button aria-haspopup="dialog" onClick={open}>
          {trigger}
        </Button>
      )}
      <ModalSheet dialog={dialog} title={title}>
        {opened ? <RemarkForm {...about} onDone={() => dialog.current?.close()} /> : null}
      </ModalSheet>
    </>
  );
}

interface RemarkFormProps extends Pick<RemarkDialogProps, "proposalId" | "target" | "parentId" | "people"> {
  onDone: () => void;
}

function RemarkForm(props: RemarkFormProps) {
  const { text, setText, refusal, busy, send } = useRemark(props);
  const id = useId();
  const isAnswer = props.parentId !== undefined;

  return (
    <form onSubmit={send} className="space-y-4">
      <MarkdownEditor
        id={`${id}-text`}
        label={isAnswer ? "Your answer" : "Remark"}
        value={text}
        onChange={setText}
        height={150}
        error={refusal?.faults.find(({ path }) => path === "text")?.sentence}
      />
      {isAnswer ? null : (
        <>
          <TextField name="suggestion" label="Suggested wording or value" optional maxLength={500} autoComplete="off" />
          <CheckField
            name="asksForAction"
            label="Ask for action"
            hint="No approving signature is taken until you, or a program manager without part in it, have settled it."
          />
        </>
      )}
      <Addressees people={props.people} error={refusal?.faults.find(({ path }) => path.startsWith("to"))?.sentence} />
      {refusal ? <Notice kind="refusal">{refusal.sentence}</Notice> : null}
      <Button type="submit" kind="primary" busy={busy}>
        {isAnswer ? "Answer" : "Add the remark"}
      </Button>
    </form>
  );
}

interface AddresseesProps {
  people: readonly PersonView[];
  error?: string;
}

/** Whom it is addressed to: they get a mail with the number and the link. */
function Addressees({ people, error }: AddresseesProps) {
  if (people.length === 0) return null;

  return (
    <fieldset>
      <legend className="mb-1 text-sm font-medium">
        Addressed to <span className="font-normal text-ink-2">(may stay empty)</span>
      </legend>
      <div className="grid gap-x-4 sm:grid-cols-2">
        {people.map(({ id, name }) => (
          <CheckField key={id} name="to" value={String(id)} label={name} />
        ))}
      </div>
      {error ? <p className="text-sm font-medium text-signal">{error}</p> : null}
    </fieldset>
  );
}

type Answer = Awaited<ReturnType<typeof addRemarkAction>>;

function useRemark({ proposalId, target, parentId, onDone }: RemarkFormProps) {
  const router = useRouter();
  const [text, setText] = useState("");
  const [key, setKey] = useState(() => crypto.randomUUID());
  const [refusal, setRefusal] = useState<Extract<Answer, { ok: false }> | null>(null);
  const [busy, start] = useTransition();

  const send = (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault();
    const form = new FormData(event.currentTarget);
    start(async () => {
      const suggestion = String(form.get("suggestion") ?? "").trim();
      const answer = await addRemarkAction({
        proposalId,
        parentId: parentId ?? null,
        line: target?.line ?? null,
        field: target?.field ?? null,
        text,
        suggestion: suggestion === "" ? null : suggestion,
        asksForAction: form.get("asksForAction") === "on",
        to: form.getAll("to").map(Number),
        key,
      });
      if (!answer.ok) return setRefusal(answer);
      setText("");
      setRefusal(null);
      setKey(crypto.randomUUID());
      onDone();
      router.refresh();
    });
  };

  return { text, setText, refusal, busy, send };
}
