"use client";

import { memo } from "react";

import { AlternateLines } from "@/app/(workspace)/_friction-pictures/alternate-lines";
import { FrictionPictures } from "@/app/(workspace)/_friction-pictures/friction-pictures";
import { WorkingNotes, WorkingSteps } from "@/app/(workspace)/products/[productCode]/_components/working-view";
import { printedStep } from "@/app/(workspace)/products/[productCode]/_workings/printed-step";
import type { Note } from "@/lib/evaluation/notes/note";
import { noteSentence } from "@/lib/evaluation/notes/note-catalogue";
import { formatPercent, formatSignificant } from "@/lib/units/format-number";

import type { TrialResult } from "../_trial/read-setting";
import type { Side } from "../_trial/setting";

interface SettingResultProps {
  side: Side;
  result: TrialResult | null;
}

/** Notes, pictures, other lines and steps of one setting; drawn anew only when its result is another. */
export const SettingResult = memo(function SettingResult({ side, result }: SettingResultProps) {
  const letter = side.toUpperCase();
  if (!result) {
    return (
      <section aria-label={`Result of ${letter}`} className="mt-5">
        <PartHeading>{letter}</PartHeading>
        <p className="text-ink-2">Nothing to draw yet: fill in what setting {letter} still needs.</p>
      </section>
    );
  }
  const { outcome, input, stream, sources, alternates, steps } = result;
  const notes = outcome.outcome === "answer" ? outcome.answer.notes : [outcome.note];

  return (
    <section aria-label={`Result of ${letter}`} className="mt-5 min-w-0">
      <PartHeading>{letter}</PartHeading>
      <StreamFacts stream={stream} sources={sources} />
      <WorkingNotes notes={notes.map(printedNote)} />
      {input && input.method !== "fixed" ? (
        <FrictionPictures version={result.version} input={input} stream={stream} name={`Setting ${letter}`} />
      ) : null}
      {alternates ? (
        <>
          <h4 className="mt-4 mb-1 text-base">
            By other friction lines{" "}
            <span className="text-sm font-normal text-ink-2">
              spread {formatPercent(alternates.spread, 1)} of this drag
            </span>
          </h4>
          <AlternateLines
            lines={alternates.lines}
            caption={`Setting ${letter} by every friction line that holds here`}
          />
        </>
      ) : null}
      {steps.length > 0 ? (
        <details className="mt-4">
          <summary className="link w-fit">Worked steps of {letter}</summary>
          <div className="mt-2">
            <WorkingSteps steps={steps.map(printedStep)} />
          </div>
        </details>
      ) : null}
    </section>
  );
});

/** What follows from the stream as typed, and by which formulas. */
function StreamFacts({ stream, sources }: Pick<TrialResult, "stream" | "sources">) {
  const values = [
    `ρ ${formatSignificant(stream.density, 4)} kg/m³`,
    `μ ${formatSignificant(stream.dynamicViscosity, 4)} Pa·s`,
    `ν ${formatSignificant(stream.kinematicViscosity, 4)} m²/s`,
    `q ${formatSignificant(stream.dynamicPressure, 4)} Pa`,
  ];

  return (
    <p className="mb-2 text-sm text-ink-2">
      {values.join(", ")}. {sources.map(({ symbol, source }) => `${symbol} by ${source}`).join("; ")}.
    </p>
  );
}

function PartHeading({ children }: { children: string }) {
  return <h3 className="mb-2 border-b border-ink pb-1 text-base">{children}</h3>;
}

function printedNote(note: Note) {
  return {
    code: note.code,
    severity: note.severity,
    sentence: noteSentence(note),
    justification: null,
  };
}
