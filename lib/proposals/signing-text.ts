import type { Effects, PointEffect } from "@/lib/evaluation/budget/effects";
import { formatHundredths, formatNewtons, formatNewtonsChange } from "@/lib/units/format-newtons";
import type { EditOperation } from "@/lib/vocabulary/lines";
import { ROLE_NAMES } from "@/lib/vocabulary/roles";
import { STANDING_NAMES } from "@/lib/vocabulary/standing";
import type { RequiredCapacity } from "@/policies/approval-routing";

/** One edited line as it is signed: its rows of canonical text that differ, in SI. */
export interface SignedLine {
  title: string;
  operation: EditOperation;
  letterWas: string | null;
  letterNow: string;
  rows: readonly { label: string; was: string | null; toBe: string | null }[];
}

export interface SignedSheet {
  label: string;
  title: string;
  round: number;
  roundHash: string;
  lines: readonly SignedLine[];
  /** "0.30 N from the unallocated rest to item 050" */
  transfers: readonly string[];
  onIssue: number;
  effects: Effects;
  routing: readonly RequiredCapacity[];
}

/** The text that a signature stands under: the round, its effect on today's issue, and what has to be signed and why. */
export function signingText(sheet: SignedSheet): string {
  return [
    `${sheet.label}, round ${sheet.round}: ${sheet.title}`,
    `round hash: ${sheet.roundHash}`,
    "",
    ...sheet.lines.flatMap(lineRows),
    ...sheet.transfers.map((transfer) => `transfer: ${transfer}`),
    "",
    `effect on issue ${sheet.onIssue}`,
    ...sheet.effects.points.map(pointRow),
    ...sheet.effects.items.map(itemRow),
    "",
    "signatures asked for",
    ...sheet.routing.flatMap(routingRows),
    "",
  ].join("\n");
}

function lineRows({ title, operation, letterWas, letterNow, rows }: SignedLine): string[] {
  const letters = letterWas === null ? letterNow : `${letterWas} to ${letterNow}`;
  return [
    `${operation} ${title}, revision ${letters}`,
    ...rows.map(({ label, was, toBe }) => `  ${label}: ${was ?? "none"} -> ${toBe ?? "none"}`),
  ];
}

function pointRow({ operatingPoint, was, now, predictedDelta }: PointEffect): string {
  if (now === null) return `${operatingPoint}: retired`;
  const figures = `predicted ${formatNewtons(now.predicted)} of ${formatHundredths(now.limitHundredths)} N, margin ${formatNewtons(now.margin)}, ${STANDING_NAMES[now.standing]}`;
  if (was === null) return `${operatingPoint}: new, ${figures}`;
  return `${operatingPoint}: ${formatNewtonsChange(predictedDelta)}, ${figures}, was ${STANDING_NAMES[was.standing]}`;
}

function itemRow({ item, operatingPoint, predictedDelta, newNotes, vanishedNotes }: Effects["items"][number]): string {
  const notes = [...newNotes.map(({ code }) => `+${code}`), ...vanishedNotes.map(({ code }) => `-${code}`)];
  return `  item ${item} at ${operatingPoint}: ${[formatNewtonsChange(predictedDelta), ...notes].join(", ")}`;
}

function routingRows({ capacity, count, reasons }: RequiredCapacity): string[] {
  return [`${ROLE_NAMES[capacity].toLowerCase()}, ${count}:`, ...reasons.map(({ sentence }) => `  ${sentence}`)];
}
