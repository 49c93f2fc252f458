import Link from "next/link";
import type { Route } from "next";

import { NoteMark } from "@/app/_components/note-mark";
import { SymbolText } from "@/app/_components/symbol-text";

import type { Working, WorkingNote, WorkingStep, WorkingTerm } from "../_workings/working";

interface WorkingViewProps {
  working: Working;
  /** Path of the product's pages, without a slash at its end. */
  base: string;
}

/** How a number came about: its answer, each step with the values in it, what is added up, notes. */
export function WorkingView({ working, base }: WorkingViewProps) {
  return (
    <div className="space-y-4">
      {working.answer ? <p className="text-xl font-semibold">{working.answer}</p> : null}
      {working.steps.length > 0 ? <WorkingSteps steps={working.steps} /> : null}
      {working.terms.length > 0 ? <WorkingTerms terms={working.terms} /> : null}
      {working.sentences.map((sentence) => (
        <p key={sentence} className="text-sm text-ink-2">
          {sentence}
        </p>
      ))}
      <WorkingNotes notes={working.notes} />
      {working.links.map(({ path, label }) => (
        <p key={path}>
          <Link href={`${base}/${path}` as Route} className="link text-sm">
            {label}
          </Link>
        </p>
      ))}
    </div>
  );
}

/** Steps of a hand calculation: what, by which formula, with which values, and what came out. */
export function WorkingSteps({ steps }: { steps: readonly WorkingStep[] }) {
  return (
    <ol className="border-t border-ink">
      {steps.map((step, at) => (
        <li key={at} className="grid gap-x-4 gap-y-0.5 border-b border-rule py-2 sm:grid-cols-[minmax(0,1fr)_auto]">
          <div className="min-w-0">
            <p className="text-sm">
              {step.quantity} <SymbolText symbol={step.symbol} />
            </p>
            {step.formula ? (
              <p className="text-sm text-ink-2">
                <SymbolText symbol={step.formula} />
              </p>
            ) : null}
            {step.withValues ? <p className="text-sm break-words text-ink-2">{step.withValues}</p> : null}
            {step.source || step.range ? (
              <p className="text-xs text-ink-2">{[step.source, step.range].filter(Boolean).join(" · ")}</p>
            ) : null}
          </div>
          <p className="font-semibold whitespace-nowrap sm:text-right">
            {step.value} <span className="font-normal text-ink-2">{step.unit}</span>
          </p>
        </li>
      ))}
    </ol>
  );
}

/** Parts that add up to the last of them. */
export function WorkingTerms({ terms }: { terms: readonly WorkingTerm[] }) {
  return (
    <table className="w-full border-collapse text-table">
      <caption className="sr-only">What is added up, in newtons</caption>
      <tbody>
        {terms.map(({ label, value }, at) => (
          <tr
            key={label}
            className={at === terms.length - 1 ? "border-t border-ink font-semibold" : "border-b border-rule"}
          >
            <th scope="row" className="py-1 pr-3 text-left font-[inherit]">
              {label}
            </th>
            <td className="py-1 text-right whitespace-nowrap">
              {value} <span className="font-normal text-ink-2">N</span>
            </td>
          </tr>
        ))}
      </tbody>
    </table>
  );
}

/** The notes of a result with their sentences, and what its owner wrote about them. */
export function WorkingNotes({ notes }: { notes: readonly WorkingNote[] }) {
  if (notes.length === 0) return null;

  return (
    <ul className="space-y-2">
      {notes.map((note, at) => (
        <li key={at}>
          <NoteMark severity={note.severity} code={note.code}>
            {note.sentence}
          </NoteMark>
          {note.justification ? <p className="ml-5 text-sm">Justified: {note.justification}</p> : null}
        </li>
      ))}
    </ul>
  );
}
