"use client";

import { NoteMark } from "@/app/_components/note-mark";
import type { ItemEffect, PointEffect } from "@/lib/evaluation/budget/effects";
import { noteSentence } from "@/lib/evaluation/notes/note-catalogue";
import { effectSentence } from "@/lib/proposals/effect-sentence";
import type { ProposalPreview } from "@/lib/proposals/preview-proposal";
import { formatNewtonsChangeNumber, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { STANDING_NAMES } from "@/lib/vocabulary/standing";

interface EffectPanelProps {
  preview: ProposalPreview;
  issue: number;
}

/** What the draft does, while it is typed: to its items, to the total and to the standing at every operating point. */
export function EffectPanel({ preview, issue }: EffectPanelProps) {
  const { effects, after } = preview.change;
  const worst = effects.points.find(({ operatingPoint }) => operatingPoint === after.results.worstPoint);

  return (
    <section aria-labelledby="effect" className="mt-4">
      <h2 id="effect" className="text-lg">
        Effect on issue {issue}
      </h2>
      <p className="mt-1 font-semibold" data-testid="effect-sentence">
        {worst ? effectSentence(worst) : "Nothing to compute yet."}
      </p>
      {effects.points.map((point) => (
        <PointEffectTable key={point.operatingPoint} point={point} items={effects.items} />
      ))}
    </section>
  );
}

function PointEffectTable({ point, items }: { point: PointEffect; items: readonly ItemEffect[] }) {
  const moved = items.filter(({ operatingPoint }) => operatingPoint === point.operatingPoint);

  return (
    <table className="mt-3 w-full border-collapse text-sm">
      <caption className="border-b border-ink pb-1 text-left font-medium">
        {point.operatingPoint} {point.name}
      </caption>
      <thead className="text-xs text-ink-2">
        <tr>
          <th scope="col" className="py-1 text-left font-medium">
            Predicted, N
          </th>
          <th scope="col" className="py-1 pl-3 text-right font-medium">
            Was
          </th>
          <th scope="col" className="py-1 pl-3 text-right font-medium">
            To be
          </th>
          <th scope="col" className="py-1 pl-3 text-right font-medium">
            Effect
          </th>
        </tr>
      </thead>
      <tbody>
        {moved.map((effect) => (
          <ItemEffectRow key={effect.item} effect={effect} />
        ))}
        <tr className="border-t border-rule-strong font-semibold">
          <th scope="row" className="py-1 text-left">
            Total
          </th>
          <td className="pl-3 text-right">{point.was ? formatNewtonsNumber(point.was.predicted) : "–"}</td>
          <td className="pl-3 text-right" data-testid={`total-${point.operatingPoint}`}>
            {point.now ? formatNewtonsNumber(point.now.predicted) : "–"}
          </td>
          <td className="pl-3 text-right">{formatNewtonsChangeNumber(point.predictedDelta)}</td>
        </tr>
        <StandingRow point={point} />
      </tbody>
    </table>
  );
}

function StandingRow({ point: { was, now } }: { point: PointEffect }) {
  const text = [was, now].flatMap((side) => (side ? [STANDING_NAMES[side.standing]] : []));

  return (
    <tr>
      <th scope="row" className="py-1 text-left font-normal text-ink-2">
        Margin to limit
      </th>
      <td className="pl-3 text-right">{was ? formatNewtonsNumber(was.margin) : "–"}</td>
      <td className="pl-3 text-right">{now ? formatNewtonsNumber(now.margin) : "–"}</td>
      <td className={`pl-3 text-right ${now?.standing === "over" ? "font-semibold text-signal" : ""}`}>
        {text[0] === text[1] ? text[0] : text.join(" → ")}
      </td>
    </tr>
  );
}

function ItemEffectRow({ effect }: { effect: ItemEffect }) {
  const { item, predictedWas, predictedNow, predictedDelta, newNotes, vanishedNotes, refusedNow } = effect;

  return (
    <tr className="border-b border-rule align-top">
      <th scope="row" className="py-1 text-left font-normal">
        {item}
        {effect.edited ? "" : " follows"}
        {refusedNow ? <NoteMark severity="refusal">{noteSentence(refusedNow)}</NoteMark> : null}
        {newNotes.map((note) => (
          <NoteMark key={note.code} severity={note.severity}>
            {noteSentence(note)}
          </NoteMark>
        ))}
        {vanishedNotes.map((note) => (
          <NoteMark key={`gone ${note.code}`} severity="information">
            no longer: {noteSentence(note)}
          </NoteMark>
        ))}
      </th>
      <td className="py-1 pl-3 text-right whitespace-nowrap">
        {predictedWas === null ? "–" : formatNewtonsNumber(predictedWas)}
      </td>
      <td className="py-1 pl-3 text-right whitespace-nowrap">
        {predictedNow === null ? "–" : formatNewtonsNumber(predictedNow)}
      </td>
      <td className="py-1 pl-3 text-right whitespace-nowrap">{formatNewtonsChangeNumber(predictedDelta)}</td>
    </tr>
  );
}
