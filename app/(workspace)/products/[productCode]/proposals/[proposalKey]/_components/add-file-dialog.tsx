"use client";

import { useRouter } from "next/navigation";
import { type FormEvent, useRef, useState } from "react";

import { Button } from "@/app/_components/button";
import { CONTROL, Field } from "@/app/_components/field";
import { ModalSheet } from "@/app/_components/modal-sheet";
import { Notice } from "@/app/_components/notice";
import { SendingBar } from "@/app/_components/sending-bar";
import { TextField } from "@/app/_components/text-field";
import { useSending } from "@/app/_components/use-sending";
import { ACCEPTED_FILES } from "@/lib/vocabulary/files";

interface AddFileDialogProps {
  productCode: string;
  proposalId: number;
}

/** Puts a file beside a submitted proposal: a marked-up print, a calculation of one's own. */
export function AddFileDialog(props: AddFileDialogProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const [opened, setOpened] = useState(false);
  const title = "Add a file beside the proposal";

  return (
    <>
      <Button
        aria-haspopup="dialog"
        onClick={() => {
          setOpened(true);
          dialog.current?.showModal();
        }}
      >
        Add a file…
      </Button>
      <ModalSheet dialog={dialog} title={title}>
        {opened ? <AddFileForm {...props} onDone={() => dialog.current?.close()} /> : null}
      </ModalSheet>
    </>
  );
}

function AddFileForm({ productCode, proposalId, onDone }: AddFileDialogProps & { onDone: () => void }) {
  const router = useRouter();
  const { share, refusal, send, refuse } = useSending();

  async function submit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault();
    const form = event.currentTarget;
    const data = new FormData(form);
    const file = data.get("file");
    if (!(file instanceof File) || file.name === "") return refuse("Choose a file.");
    const sourceDate = String(data.get("sourceDate") ?? "");
    const sent = await send({ productCode, proposalId, place: "proposal", sourceDate, file });
    if (!sent.ok) return;
    form.reset();
    onDone();
    router.refresh();
  }

  return (
    <form onSubmit={(event) => void submit(event)} className="space-y-4">
      <p>
        Every member can open it. What the items themselves rest on belongs into their citations, where the signatures
        cover it.
      </p>
      <Field label="File" hint={`${ACCEPTED_FILES}.`}>
        {(aria) => <input {...aria} type="file" name="file" required className={CONTROL} />}
      </Field>
      <TextField name="sourceDate" type="date" label="Date of the document" required />
      {share === null ? null : <SendingBar share={share} name="the file" />}
      {refusal ? <Notice kind="refusal">{refusal}</Notice> : null}
      <Button type="submit" kind="primary" busy={share !== null}>
        Add the file
      </Button>
    </form>
  );
}
