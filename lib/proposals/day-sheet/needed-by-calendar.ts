import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { inSnapshot } from "@/models/database";
import { calendarText, type CalendarDay } from "../notices/calendar-text";
import { isMine, openProposals, type OpenProposals } from "./waiting-for";

/**
 * The needed-by dates that concern a person, as a calendar file: what waits for them, and what they proposed. It tells
 * number and link and no figure, for calendars are kept and shared elsewhere.
 */
export function neededByCalendar(
  actor: Actor,
  { baseUrl }: { baseUrl: string },
  clock: Clock = systemClock,
): Promise<string> {
  return inSnapshot(async (tx) => {
    const at = clock();
    const products = await openProposals(actor, at.toISOString(), tx);
    return calendarText(
      products.flatMap((product) => daysOf(actor, product, baseUrl.replace(/\/+$/, ""))),
      at,
    );
  });
}

function daysOf(actor: Actor, { product, open }: OpenProposals, baseUrl: string): CalendarDay[] {
  return open.flatMap(({ listed, tasks }) => {
    const { proposalId, key, label, neededBy } = listed.row;
    if (neededBy === null || (tasks.length === 0 && !isMine(actor, listed))) return [];
    const what = tasks.map((task) => task.what).join("\n");
    return [
      {
        uid: `proposal-${proposalId}-needed-by@leeboard.invalid`,
        day: neededBy,
        summary: `${label} is needed`,
        description: what === "" ? "It waits for others." : what,
        url: `${baseUrl}/products/${product.code}/proposals/${key}`,
      },
    ];
  });
}
