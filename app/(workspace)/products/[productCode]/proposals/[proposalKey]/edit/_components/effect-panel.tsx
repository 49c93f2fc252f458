"use client";

import { chosenMeasure } from "@/app/(workspace)/_measures/chosen-measure";
import { type EffectReading, effectReadings, effectText, readingAt } from "@/app/(workspace)/_measures/effect-readings";
import { NoteMark } from "@/app/_components/note-mark";
import type { ItemEffect, PointEffect } from "@/lib/evaluation/budget/effects";
import { touchesOf } from "@/lib/evaluation/budget/touches";
import { effectBases } from "@/lib/evaluation/measures/effect-bases";
import { readNumber } from "@/lib/evaluation/measures/reading";
import { noteSentence } from "@/lib/evaluation/notes/note-catalogue";
import { effectSentence } from "@/lib/proposals/review/effect-sentence";
import type { BudgetAtIssue, ProposalPreview } from "@/lib/proposals/review/preview-proposal";
import type { DraftEdit } from "@/lib/proposals/schema";
import { touchSentence, touchTitle } from "@/lib/proposals/review/touch-text";
import type { Preferences } from "@/lib/vocabulary/measures";
import { STANDING_NAMES } from "@/lib/vocabulary/standing";

interface EffectPanelProps {
  preview: ProposalPreview;
  /** On which the draft stands. */
  budget: BudgetAtIssue;
  edits: readonly DraftEdit[];
  preferences: Preferences;
}

/** What the draft does, while it is typed: to its items, to the total and to the standing at every operating point. */
export function EffectPanel({ preview, budget, edits, preferences }: EffectPanelProps) {
  const { effects, after } = preview.change;
  const bases = effectBases(budget, after);
  const worstBasis = bases.find(({ operatingPoint }) => operatingPoint === after.results.worstPoint)?.now;
  const chosen = chosenMeasure(undefined, preferences, worstBasis ? [worstBasis] : []);
  const readings = effectReadings(chosen, bases);
  const touches = touchesOf(budget.state, after.state, edits);
  const worst = effects.points.find(({ operatingPoint }) => operatingPoint === after.results.worstPoint);

  return (
    <section aria-labelledby="effect" className="mt-4">
      <h2 id="effect" className="text-lg">
        Effect on issue {budget.issue}
      </h2>
      <p className="mt-1 font-semibold" data-testid="effect-sentence">
        {worst ? effectSentence(worst) : "Nothing to compute yet."}
      </p>
      {touches.map((touch) => (
        <p key={touchTitle(touch)} className="mt-2 text-sm">
          <span className="font-semibold">{touchTitle(touch)}</span> {touchSentence(touch, effects.items)}
        </p>
      ))}
      {effects.points.map((point) => (
        <PointEffectTable
          key={point.operatingPoint}
          point={point}
          items={effects.items}
          reading={readingAt(readings, point.operatingPoint)}
        />
      ))}
    </section>
  );
}

interface PointEffectTableProps {
  point: PointEffect;
  items: readonly ItemEffect[];
  reading: EffectReading;
}

function PointEffectTable({ point, items, reading }: PointEffectTableProps) {
  const moved = items.filter(({ operatingPoint }) => operatingPoint === point.operatingPoint);
  const { was, now, predictedDelta: delta } = point;
  const movedTotal = { was: was?.predicted ?? null, now: now?.predicted ?? null, delta };

  return (
    <table className="mt-3 w-full border-collapse text-sm">
      <caption className="border-b border-ink pb-1 text-left font-medium">
        {point.operatingPoint} {point.name}
      </caption>
      <thead className="text-xs text-ink-2">
        <tr>
          <th scope="col" className="py-1 text-left font-medium">
            Predicted{reading.now.unit ? `, ${reading.now.unit}` : ""}
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
          <ItemEffectRow key={effect.item} effect={effect} reading={reading} />
        ))}
        <tr className="border-t border-rule-strong font-semibold">
          <th scope="row" className="py-1 text-left">
            Total
          </th>
          <td className="pl-3 text-right">{point.was ? readNumber(reading.was, point.was.predicted) : "–"}</td>
          <td className="pl-3 text-right" data-testid={`total-${point.operatingPoint}`}>
            {point.now ? readNumber(reading.now, point.now.predicted) : "–"}
          </td>
          <td className="pl-3 text-right">{effectText(reading, movedTotal, false)}</td>
        </tr>
        <StandingRow point={point} reading={reading} />
      </tbody>
    </table>
  );
}

function StandingRow({ point: { was, now }, reading }: { point: PointEffect; reading: EffectReading }) {
  const text = [was, now].flatMap((side) => (side ? [STANDING_NAMES[side.standing]] : []));

  return (
    <tr>
      <th scope="row" className="py-1 text-left font-normal text-ink-2">
        Margin to limit
      </th>
      <td className="pl-3 text-right">{was ? readNumber(reading.was, was.margin) : "–"}</td>
      <td className="pl-3 text-right">{now ? readNumber(reading.now, now.margin) : "–"}</td>
      <td className={`pl-3 text-right ${now?.standing === "over" ? "font-semibold text-signal" : ""}`}>
        {text[0] === text[1] ? text[0] : text.join(" → ")}
      </td>
    </tr>
  );
}

function ItemEffectRow({ effect, reading }: { effect: ItemEffect; reading: EffectReading }) {
  const { item, predictedWas, predictedNow, predictedDelta, newNotes, vanishedNotes, refusedNow } = effect;
  const moved = { was: predictedWas, now: predictedNow, delta: predictedDelta };

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
        {predictedWas === null ? "–" : readNumber(reading.was, predictedWas)}
      </td>
      <td className="py-1 pl-3 text-right whitespace-nowrap">
        {predictedNow === null ? "–" : readNumber(reading.now, predictedNow)}
      </td>
      <td className="py-1 pl-3 text-right whitespace-nowrap">{effectText(reading, moved, false)}</td>
    </tr>
  );
}
