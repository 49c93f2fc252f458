import { LINE_KIND_NAMES } from "@/lib/vocabulary/lines";
import { comparedText } from "./compared-text";
import { sameValue } from "../records/same-value";
import type { SeenSheet } from "./seen-sheet";
import type { MovedView } from "../sheet-views";

type Line = SeenSheet["lines"][number];

/** What a sheet says now that it did not say at an earlier look. */
export function movedSince(earlier: SeenSheet, since: string, now: SeenSheet): MovedView {
  return {
    ...{ since, round: earlier.round },
    fields: now.lines.flatMap((line) => movedFields(counterpart(earlier, line), line)),
    sentences: sentences(earlier, now),
    reason: comparedWhole(earlier.reason, now.reason),
    signingText: comparedWhole(earlier.signingText ?? "", now.signingText ?? ""),
  };
}

/** Where the line was not part of the change, its heading says so and no field is marked. */
function movedFields(earlier: Line | undefined, { kind, number, fields }: Line): MovedView["fields"] {
  if (!earlier) return [];
  return Object.entries(fields).flatMap(([field, text]) => {
    const saw = earlier.fields[field] ?? null;
    return saw === text ? [] : [{ kind, number, field, saw }];
  });
}

function sentences(earlier: SeenSheet, now: SeenSheet): string[] {
  const added = now.lines.filter((line) => !counterpart(earlier, line));
  const gone = earlier.lines.filter((line) => !counterpart(now, line));
  return [
    ...(earlier.round === now.round ? [] : [`Round ${now.round} was submitted; you saw ${roundName(earlier.round)}.`]),
    ...(earlier.title === now.title ? [] : [`It was titled “${earlier.title}”.`]),
    ...(earlier.neededBy === now.neededBy ? [] : [`The day by which it is needed was ${earlier.neededBy ?? "open"}.`]),
    ...added.map((line) => `${lineText(line)} was not part of it.`),
    ...gone.map((line) => `${lineText(line)} is no longer part of it.`),
    ...(sameValue(earlier.transfers, now.transfers) ? [] : [transfersSentence(earlier.transfers)]),
    ...(earlier.onIssue === now.onIssue && sameValue(earlier.effects, now.effects)
      ? []
      : [effectsSentence(earlier, now)]),
  ];
}

function roundName(round: number): string {
  return round === 0 ? "the working copy" : `round ${round}`;
}

function transfersSentence(transfers: readonly string[]): string {
  return transfers.length === 0 ? "It had no transfer." : `The transfers were: ${transfers.join("; ")}.`;
}

function effectsSentence({ effects, onIssue }: SeenSheet, now: SeenSheet): string {
  const was = effects.length === 0 ? "could not be computed" : `was ${effects.join(", ")} on issue ${onIssue}`;
  const is =
    now.effects.length === 0 ? "cannot be computed now" : `is ${now.effects.join(", ")} on issue ${now.onIssue}`;
  return `Its effect ${was}; it ${is}.`;
}

function counterpart({ lines }: SeenSheet, { kind, number }: Line): Line | undefined {
  return lines.find((line) => line.kind === kind && line.number === number);
}

function lineText({ kind, number, name }: Line): string {
  return `${LINE_KIND_NAMES[kind]} ${number} ${name}`.trim();
}

/** Even a short text is shown with what it said. */
function comparedWhole(was: string, toBe: string): MovedView["reason"] {
  if (was === toBe) return null;
  return (
    comparedText(was, toBe) ?? {
      was,
      toBe,
      rows: [
        { side: "was", text: was },
        { side: "toBe", text: toBe },
      ],
    }
  );
}
