import { QueryTypes, type Transaction } from "sequelize";
import type { Actor } from "@/lib/vocabulary/actor";
import { systemClock, type Clock } from "@/lib/vocabulary/clock";
import { database, inSnapshot } from "@/models/database";
import { openProposals } from "./waiting-for";

/** What a count was made of: it stands as long as this stays. */
interface Counted {
  basis: string;
  count: number;
}

const MOST_PERSONS = 500;
/** Days begin on a quarter of an hour in every time zone, and with a day a deputy's right may begin or end. */
const QUARTER = 15 * 60_000;

const counted = new Map<number, Counted>();

/**
 * How much waits for a person: for the head of every page, asked again and again. Whatever can change it is an act, so
 * it is counted anew only when the history grew or a day may have begun.
 */
export function waitingCount(actor: Actor, clock: Clock = systemClock): Promise<number> {
  return inSnapshot(async (tx) => {
    const at = clock();
    const basis = `${await newestEntryId(tx)} ${Math.floor(at.getTime() / QUARTER)} ${JSON.stringify(actor)}`;
    const known = counted.get(actor.userId);
    if (known?.basis === basis) return known.count;

    const products = await openProposals(actor, at.toISOString(), tx);
    const count = products.flatMap(({ open }) => open.flatMap(({ tasks }) => tasks)).length;
    counted.delete(actor.userId);
    counted.set(actor.userId, { basis, count });
    for (const oldest of counted.keys()) {
      if (counted.size <= MOST_PERSONS) break;
      counted.delete(oldest);
    }
    return count;
  });
}

async function newestEntryId(tx: Transaction): Promise<number> {
  const [row] = await database.query<{ id: number | null }>("SELECT max(id) AS id FROM history_entries", {
    type: QueryTypes.SELECT,
    transaction: tx,
  });
  return row?.id ?? 0;
}
