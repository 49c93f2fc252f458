import { z } from "zod";
import { formatNewtonsChange } from "@/lib/units/format-newtons";
import { LINE_KINDS } from "@/lib/vocabulary/lines";
import type { LineChangeView, ProposalView } from "../views";

const SeenLine = z.strictObject({
  kind: z.enum(LINE_KINDS),
  number: z.string(),
  name: z.string(),
  /** What each field was to be, as printed. */
  fields: z.record(z.string(), z.string().nullable()),
});

/** What one look at a change sheet shows of what may move: printed texts, so that it can be read whatever changes. */
export const SeenSheet = z.strictObject({
  round: z.int(),
  title: z.string(),
  reason: z.string(),
  neededBy: z.string().nullable(),
  lines: z.array(SeenLine),
  transfers: z.array(z.string()),
  onIssue: z.int(),
  effects: z.array(z.string()),
  signingText: z.string().nullable(),
});
export type SeenSheet = z.infer<typeof SeenSheet>;

/** The sheet as its reader sees it now. */
export function seenSheet(view: ProposalView): SeenSheet {
  const effect = view.effectToday ?? view.effectOnBase;
  return {
    ...{ title: view.title, reason: view.reason, neededBy: view.neededBy },
    round: view.round?.round ?? 0,
    lines: view.lines.map(seenLine),
    transfers: view.transfers.map(
      ({ giver, receiver, hundredths }) => `${giver.name} to ${receiver.name}: ${(hundredths / 100).toFixed(2)} N`,
    ),
    onIssue: effect?.onIssue ?? view.newestIssue,
    effects: (effect?.points ?? []).map(
      ({ operatingPoint, predictedDelta }) => `${operatingPoint} ${formatNewtonsChange(predictedDelta)}`,
    ),
    signingText: view.signingSheet?.text ?? null,
  };
}

function seenLine({ kind, number, name, rows }: LineChangeView): SeenSheet["lines"][number] {
  const printed = rows.map(({ field, toBe, unit }) => [field, toBe && unit ? `${toBe} ${unit}` : toBe] as const);
  return { kind, number, name, fields: Object.fromEntries(printed) };
}
