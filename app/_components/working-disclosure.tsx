"use client";

import { type ReactNode, useRef, useState } from "react";

import { ModalSheet } from "./modal-sheet";

interface WorkingDisclosureProps {
  /** The number as printed. */
  value: ReactNode;
  /** Says which number this is: "Basic estimate of 010 Roof shell at OP-1". Title of what opens. */
  title: string;
  /** How it came about: formula with the values in it, source, range, notes. */
  children: ReactNode;
}

/** A number that answers a click with its working. */
export function WorkingDisclosure({ value, title, children }: WorkingDisclosureProps) {
  const dialog = useRef<HTMLDialogElement>(null);
  const [open, setOpen] = useState(false);

  return (
    <>
      <button
        type="button"
        aria-haspopup="dialog"
        title={title}
        className="min-h-6 underline decoration-rule-strong decoration-dotted underline-offset-4 hover:decoration-ink hover:decoration-solid"
        onClick={() => {
          setOpen(true);
          dialog.current?.showModal();
        }}
      >
        {value}
        <span className="sr-only">, how it came about</span>
      </button>
      <ModalSheet dialog={dialog} title={title} onClose={() => setOpen(false)}>
        {open ? children : null}
      </ModalSheet>
    </>
  );
}
