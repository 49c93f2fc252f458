import { asRecord } from "@/app/_components/line-fields/body";
import { itemProblems } from "@/lib/evaluation/budget/item-problems";
import type { IndexedState } from "@/lib/evaluation/budget/indexed-state";
import { type EvaluatedBody, methodInputOf, streamInputOf } from "@/lib/evaluation/budget/method-input";
import type { MethodInput, StreamInput } from "@/lib/evaluation/document/schema";
import type { ItemBody } from "@/lib/evaluation/lines/item-body";
import { parseBody } from "@/lib/evaluation/lines/parse-body";
import { type StreamSource, streamSources } from "@/lib/evaluation/lines/stream-sources";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import { type AlternateLines, alternateLines } from "@/lib/evaluation/methods/alternate-lines";
import { evaluateMethod, type MethodOutcome } from "@/lib/evaluation/methods/method-registry";
import { FIRST_METHOD_VERSION } from "@/lib/evaluation/methods/method-versions";
import { type StreamState, streamStateOf } from "@/lib/evaluation/methods/stream-state";
import { type WorkedStep, workedSteps } from "@/lib/evaluation/methods/worked-steps";
import { FINISH_CATALOGUE } from "@/lib/products/finish-catalogue";
import { formatExact } from "@/lib/units/format-number";
import type { FieldFault } from "@/lib/vocabulary/refusal";

import type { TrialSetting } from "./setting";

/** A setting that can be computed, with everything that its sheet shows. */
export interface TrialResult {
  stream: StreamState;
  sources: StreamSource[];
  /** Of the method. */
  version: number;
  /** null for a share, which has no stream of its own. */
  input: MethodInput | null;
  outcome: MethodOutcome;
  steps: WorkedStep[];
  alternates: AlternateLines | null;
}

export interface TrialReading {
  /** null while a field is missing or wrong. */
  result: TrialResult | null;
  /** At "point.…", "item.…" or "membersSum". */
  faults: FieldFault[];
}

const NUMBER = "TRIAL";

/** Computes a setting as a budget would, or says at which fields it can't be. */
export function readSetting(setting: TrialSetting): TrialReading {
  const point = parseBody("operating_point", { ...setting.point, name: NUMBER });
  const item = parseBody("item", asOfABudget(setting.item));
  const faults = [
    ...(point.ok ? [] : below("point", point.faults)),
    ...(item.ok ? [] : below("item", item.faults)),
    ...(setting.item.method === "share" ? membersFaults(setting) : []),
  ];
  if (!point.ok || !item.ok || faults.length > 0) return { result: null, faults };
  if (point.content.kind !== "operating_point" || item.content.kind !== "item") return { result: null, faults };

  const { body } = item.content;
  const stream = streamInputOf(point.content.body);
  const flow = { stream: streamStateOf(stream), sources: streamSources(point.content.body) };
  if (body.method === "share") return { result: shareResult(body.fraction, membersSumOf(setting), flow), faults };
  const state = stateWith(body);
  const problems = itemProblems(state, {}).flatMap(({ causes }) => causes);
  const own = problems.filter(({ kind, number }) => kind === "item" && number === NUMBER);
  if (own.length > 0) {
    const told = own.map(({ path, sentence }) => ({ path: path.replace(/^body\./, ""), sentence }));
    return { result: null, faults: below("item", told) };
  }
  return { result: resultOf(body, state, stream, flow), faults };
}

/** What a budget asks besides, and a trial doesn't, filled in for computing alone. */
function asOfABudget(item: TrialSetting["item"]): object {
  const filled = {
    name: NUMBER,
    ownerId: 1,
    order: 0,
    source: NUMBER,
    shelterReason: NUMBER,
    testDate: "2000-01-01",
    of: [NUMBER],
    ofGroup: null,
  };
  return { ...item, ...Object.fromEntries(Object.entries(filled).filter(([key]) => key in item)) };
}

function below(part: "point" | "item", faults: readonly FieldFault[]): FieldFault[] {
  return faults.map(({ path, sentence }) => ({ path: `${part}.${path}`, sentence }));
}

function membersSumOf({ membersSum }: TrialSetting): number | null {
  const { value } = asRecord(membersSum);
  return typeof value === "number" ? value : null;
}

function membersFaults(setting: TrialSetting): FieldFault[] {
  return membersSumOf(setting) === null ? [{ path: "membersSum", sentence: "Give a value." }] : [];
}

type Flow = Pick<TrialResult, "stream" | "sources">;

function shareResult(fraction: number, membersSum: number | null, flow: Flow): TrialResult {
  const drag = fraction * (membersSum ?? 0);
  const step: WorkedStep = {
    quantity: "Share of the members",
    symbol: "B",
    formula: "B = share · ΣB of the members",
    withValues: `${formatExact(fraction)} · ${formatExact(membersSum ?? 0)}`,
    value: drag,
    unit: "N",
  };
  return {
    ...flow,
    version: FIRST_METHOD_VERSION,
    input: null,
    outcome: { outcome: "answer", answer: { drag, notes: [] } },
    steps: [step],
    alternates: null,
  };
}

function resultOf(body: EvaluatedBody, state: IndexedState, point: StreamInput, flow: Flow): TrialResult {
  const input = methodInputOf(body, state);
  const { stream } = flow;
  return {
    ...flow,
    version: body.methodVersion,
    input,
    outcome: evaluateMethod(body.method, body.methodVersion, input, stream),
    steps: workedSteps(body.method, body.methodVersion, input, point),
    alternates: alternateLines(body.methodVersion, input, stream),
  };
}

/** A budget of this one item, with the catalogue's finishes. */
function stateWith(body: ItemBody): IndexedState {
  return {
    product: { code: NUMBER, name: NUMBER, kind: "other_body" },
    terms: newTerms({ referenceOperatingPoint: NUMBER, reserveHundredths: 0 }),
    allocations: { rows: [], unallocatedHundredths: 0 },
    items: new Map([[NUMBER, body]]),
    groups: new Map(),
    operatingPoints: new Map(),
    finishes: new Map(FINISH_CATALOGUE.map(({ number, body: finish }) => [number, finish])),
  };
}
