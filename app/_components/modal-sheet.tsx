"use client";

import { type ReactNode, type RefObject, useId } from "react";

interface ModalSheetProps {
  dialog: RefObject<HTMLDialogElement | null>;
  title: string;
  children: ReactNode;
  onClose?: () => void;
}

/** A sheet laid over the page: the browser's own dialog, so Escape, focus and the inert page come with it. */
export function ModalSheet({ dialog, title, children, onClose }: ModalSheetProps) {
  const titleId = useId();

  return (
    <dialog
      ref={dialog}
      aria-labelledby={titleId}
      onClose={onClose}
      className="m-auto max-h-[90dvh] w-[min(42rem,calc(100vw-1.5rem))] overflow-y-auto border border-t-[3px] border-rule-strong border-t-ink bg-sheet p-4 text-left text-base font-normal whitespace-normal text-ink sm:p-6 print:hidden"
    >
      <div className="mb-3 flex items-baseline gap-4">
        <h2 id={titleId} className="text-lg">
          {title}
        </h2>
        <button type="button" className="link ml-auto text-sm" onClick={() => dialog.current?.close()}>
          Close
        </button>
      </div>
      {children}
    </dialog>
  );
}
