import type { Effects, ItemEffect, PointEffect, PointFigures } from "@/lib/evaluation/budget/effects";
import type { Note } from "@/lib/evaluation/notes/note";
import { noteSentence } from "@/lib/evaluation/notes/note-catalogue";
import { formatHundredths, formatNewtons, formatNewtonsChange } from "@/lib/units/format-newtons";
import type { EditOperation } from "@/lib/vocabulary/lines";
import type { Decision } from "@/lib/vocabulary/proposals";
import { CAPACITIES, ROLE_NAMES, type Capacity } from "@/lib/vocabulary/roles";
import { STANDING_NAMES } from "@/lib/vocabulary/standing";
import type { RequiredCapacity } from "@/policies/approval-routing";
import { isRoutingRule } from "./routing-rules";

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
  /** Files that it cites and that were voided, a sentence each. */
  voidedEvidence: readonly string[];
  onIssue: number;
  effects: Effects;
  /** Why it cannot be applied to that issue; empty when it can. */
  obstacles: readonly string[];
  routing: readonly RequiredCapacity[];
}

const ROUTING_HEADING = "signatures asked for";
const SIGNED_HEADING = "signed";
const BY_SUBMITTING = "signed by submitting";

/** The text that a signature stands under: the round, its effect on today's issue, and what has to be signed and why. */
export function signingText(sheet: SignedSheet): string {
  return [
    `${sheet.label}, round ${sheet.round}: ${sheet.title}`,
    `round hash: ${sheet.roundHash}`,
    "",
    ...sheet.lines.flatMap(lineRows),
    ...sheet.transfers.map((transfer) => `transfer: ${transfer}`),
    ...sheet.voidedEvidence.map((sentence) => `evidence: ${sentence}`),
    "",
    `effect on issue ${sheet.onIssue}`,
    ...sheet.effects.points.map(pointRow),
    ...sheet.effects.items.flatMap(itemRows),
    ...sheet.obstacles.map((obstacle) => `cannot be applied: ${obstacle}`),
    "",
    ROUTING_HEADING,
    ...sheet.routing.flatMap(routingRows),
    "",
  ].join("\n");
}

export interface SignerBlock {
  decision: Decision;
  capacity: Capacity;
  meaning: string | null;
  reason: string | null;
  printedName: string;
  deputyForName: string | null;
  at: string;
  /** Hash of the text as it was shown. */
  shownHash: string;
}

/** What is kept of a signature: the text as it was shown, and who signed it, how and when. */
export function signedText(shown: string, signer: SignerBlock): string {
  const oneRow = (text: string) => text.replace(/\\/g, "\\\\").replace(/\n/g, "\\n");
  return [
    shown,
    SIGNED_HEADING,
    `decision: ${signer.decision}`,
    `capacity: ${signer.capacity}`,
    `meaning: ${oneRow(signer.meaning ?? "none")}`,
    `reason: ${oneRow(signer.reason ?? "none")}`,
    `printed name: ${signer.printedName}`,
    `deputy for: ${signer.deputyForName ?? "none"}`,
    `at: ${signer.at}`,
    `hash of the text above as shown: ${signer.shownHash}`,
    "",
  ].join("\n");
}

/** What a kept text says has to be signed: within a round that only grows. */
export function routingOfText(text: string): RequiredCapacity[] {
  const rows = text.split("\n");
  const start = rows.lastIndexOf(ROUTING_HEADING);
  const section = rows.slice(start + 1, rows.indexOf("", start));
  const routing: RequiredCapacity[] = [];
  for (const row of section) {
    const [, rule = "", sentence = ""] = /^ {2}(\w+): (.*)$/.exec(row) ?? [];
    if (isRoutingRule(rule)) routing.at(-1)?.reasons.push({ rule, sentence });
    const [name, count, submitting] = row.split(", ");
    const capacity = CAPACITIES.find((each) => ROLE_NAMES[each].toLowerCase() === name);
    if (!capacity) continue;
    routing.push({ capacity, count: Number(count), reasons: [], signedBySubmitting: submitting === BY_SUBMITTING });
  }
  return routing;
}

function lineRows({ title, operation, letterWas, letterNow, rows }: SignedLine): string[] {
  const letters = letterWas === null ? letterNow : `${letterWas} to ${letterNow}`;
  return [
    `${operation} ${title}, revision ${letters}`,
    ...rows.map(({ label, was, toBe }) => `  ${label}: ${was ?? "none"} -> ${toBe ?? "none"}`),
  ];
}

function pointRow({ operatingPoint, name, was, now, predictedDelta, marginDelta }: PointEffect): string {
  const point = `${operatingPoint} ${name}`;
  if (now === null) return was === null ? `${point}: retired` : `${point}: retired, was ${figuresText(was)}`;
  if (was === null) return `${point}: new, ${figuresText(now)}`;
  const deltas = `${formatNewtonsChange(predictedDelta)}, margin ${formatNewtonsChange(marginDelta)}`;
  return `${point}: ${deltas}, ${figuresText(now)}, was ${figuresText(was)}`;
}

function figuresText(figures: PointFigures): string {
  const { basic, growth, predicted, limitHundredths, reserveHundredths, margin, clearOfReserve, standing } = figures;
  return [
    `basic ${formatNewtons(basic)} and growth ${formatNewtons(growth)}`,
    `predicted ${formatNewtons(predicted)} of ${formatHundredths(limitHundredths)} N`,
    `reserve ${formatHundredths(reserveHundredths)} N`,
    `margin ${formatNewtons(margin)}`,
    `clear of the reserve ${formatNewtons(clearOfReserve)}`,
    STANDING_NAMES[standing],
  ].join(", ");
}

function itemRows(effect: ItemEffect): string[] {
  const { item, operatingPoint, edited, predictedDelta, basicDelta } = effect;
  const side = (name: string, basic: number | null, predicted: number | null) =>
    `${name} ${basic === null ? "none" : formatNewtons(basic)} / ${predicted === null ? "none" : formatNewtons(predicted)}`;
  const figures = [
    formatNewtonsChange(predictedDelta),
    `basic ${formatNewtonsChange(basicDelta)}`,
    side("was", effect.basicWas, effect.predictedWas),
    side("to be", effect.basicNow, effect.predictedNow),
  ];
  const note = (word: string) => (each: Note) => `    ${word} ${each.severity} ${each.code}: ${noteSentence(each)}`;
  return [
    `  item ${item}${edited ? "" : ", which only follows,"} at ${operatingPoint}: ${figures.join(", ")}`,
    ...effect.newNotes.map(note("new")),
    ...effect.vanishedNotes.map(note("no longer")),
    ...(effect.refusedNow ? [note("refused by")(effect.refusedNow)] : []),
  ];
}

function routingRows({ capacity, count, reasons, signedBySubmitting }: RequiredCapacity): string[] {
  const head = [ROLE_NAMES[capacity].toLowerCase(), String(count), ...(signedBySubmitting ? [BY_SUBMITTING] : [])];
  return [head.join(", "), ...reasons.map(({ rule, sentence }) => `  ${rule}: ${sentence}`)];
}
