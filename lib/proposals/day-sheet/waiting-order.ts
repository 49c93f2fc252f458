import { marginShare } from "../review/margin-share";
import type { MarginEffect } from "../workspace-views";

export const WAITING_ORDERS = ["needed", "margin"] as const;
export type WaitingOrder = (typeof WAITING_ORDERS)[number];

interface Waiting {
  neededBy: string | null;
  margin: MarginEffect | null;
  since: string;
}

/** The most pressing first: by the day on which it is needed, or by the share of the margin that it takes. */
export function inWaitingOrder<Entry extends Waiting>(entries: readonly Entry[], order: WaitingOrder): Entry[] {
  const rules = order === "needed" ? [byDay, byShare, byAge] : [byShare, byDay, byAge];
  return [...entries].sort((one, other) => rules.reduce((found, rule) => found || rule(one, other), 0));
}

/** What has no date comes after what has one. */
function byDay(one: Waiting, other: Waiting): number {
  if (one.neededBy === other.neededBy) return 0;
  if (one.neededBy === null || other.neededBy === null) return one.neededBy === null ? 1 : -1;
  return one.neededBy < other.neededBy ? -1 : 1;
}

function byShare(one: Waiting, other: Waiting): number {
  const [first, second] = [marginShare(one.margin), marginShare(other.margin)];
  return first === second ? 0 : second - first;
}

function byAge(one: Waiting, other: Waiting): number {
  return one.since < other.since ? -1 : Number(one.since > other.since);
}
