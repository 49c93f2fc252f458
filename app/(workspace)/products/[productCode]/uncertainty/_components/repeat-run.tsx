"use client";

import { useState } from "react";
import { z } from "zod";

import { Notice } from "@/app/_components/notice";

import { DrawingProgress } from "./drawing-progress";
import { useDrawing } from "./use-drawing";

interface RepeatRunProps {
  productCode: string;
  runId: number;
  draws: number;
}

const Repeated = z.object({ sameInput: z.boolean(), sameResult: z.boolean() });

/** Draws a kept run again and says whether the same came out; nothing is kept of it. */
export function RepeatRun({ productCode, runId, draws }: RepeatRunProps) {
  const { done, refused, draw, stop } = useDrawing();
  const [repeated, setRepeated] = useState<z.output<typeof Repeated> | null>(null);

  async function repeat() {
    setRepeated(null);
    const value = await draw(`/api/products/${encodeURIComponent(productCode)}/monte-carlo/${runId}`, {});
    if (value !== undefined) setRepeated(Repeated.parse(value));
  }

  return (
    <div className="min-w-44 print:hidden">
      {done === null ? (
        <button type="button" className="link min-h-6 text-sm" onClick={() => void repeat()}>
          Draw again and compare
        </button>
      ) : (
        <DrawingProgress done={done} draws={draws} onStop={stop} />
      )}
      {refused ? <Notice kind="refusal">{refused.sentence}</Notice> : null}
      {repeated ? <Outcome {...repeated} /> : null}
    </div>
  );
}

function Outcome({ sameInput, sameResult }: z.output<typeof Repeated>) {
  if (sameInput && sameResult) return <Notice kind="done">The same bytes came out.</Notice>;
  return (
    <Notice kind="refusal">
      {sameInput
        ? "Something else came out of the same input: what is kept was altered, or what draws was."
        : "It was drawn from something else: its input no longer has the hash that is kept."}
    </Notice>
  );
}
