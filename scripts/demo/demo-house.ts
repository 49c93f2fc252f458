import { createAccount } from "@/lib/products/create-account";
import { actorById } from "@/lib/users/queries";
import type { Actor } from "@/lib/vocabulary/actor";
import type { Clock } from "@/lib/vocabulary/clock";
import { createFirstAdministrator } from "../first-administrator";
import { DEMO_ADMINISTRATOR, DEMO_PASSWORD, DEMO_PEOPLE, type DemoPerson } from "./people";

const DAY_MS = 24 * 60 * 60 * 1000;
const BETWEEN_ACTS_MS = 83_000;

/** The people of the demo and the time in which they act. */
export interface DemoHouse {
  clock: Clock;
  /** Moves the clock to a time of a past day; between two acts it goes on by itself. */
  at: (daysAgo: number, time: string) => void;
  /** The day so many days before the demo was filled, for citations and needed-by dates; negative is ahead. */
  day: (daysAgo: number) => string;
  /** The person with the roles that they hold at the demo's present moment. */
  actor: (person: DemoPerson) => Promise<Actor>;
  idOf: (person: DemoPerson) => number;
}

/** Opens all accounts, the administrator's first, as on a new installation. */
export async function openDemoHouse(filledAt: Date, openedDaysAgo: number): Promise<DemoHouse> {
  const ids = new Map<DemoPerson, number>();
  const time = demoTime(filledAt);
  const idOf = (person: DemoPerson) => {
    const id = ids.get(person);
    if (id === undefined) throw new Error(`${person} has no account yet`);
    return id;
  };
  const house: DemoHouse = {
    ...time,
    idOf,
    actor: async (person) => {
      const account = await actorById(idOf(person), time.now().toISOString());
      if (!account) throw new Error(`the account of ${person} is closed`);
      return account.actor;
    },
  };

  house.at(openedDaysAgo, "07:30");
  const first = { ...DEMO_PEOPLE[DEMO_ADMINISTRATOR], password: DEMO_PASSWORD };
  ids.set(DEMO_ADMINISTRATOR, await createFirstAdministrator(house.clock, first));
  const administrator = await house.actor(DEMO_ADMINISTRATOR);
  for (const person of demoPersons()) {
    if (person === DEMO_ADMINISTRATOR) continue;
    const account = { ...DEMO_PEOPLE[person], password: DEMO_PASSWORD, isAdministrator: false };
    ids.set(person, (await createAccount(administrator, account, house.clock)).userId);
  }
  return house;
}

function demoPersons(): DemoPerson[] {
  return Object.keys(DEMO_PEOPLE).filter((name): name is DemoPerson => name in DEMO_PEOPLE);
}

function demoTime(filledAt: Date) {
  const today = Date.UTC(filledAt.getUTCFullYear(), filledAt.getUTCMonth(), filledAt.getUTCDate());
  let moment = today;
  return {
    now: () => new Date(moment),
    clock: () => new Date((moment += BETWEEN_ACTS_MS)),
    day: (daysAgo: number) => new Date(today - daysAgo * DAY_MS).toISOString().slice(0, 10),
    at: (daysAgo: number, time: string) => {
      if (daysAgo < 1) throw new Error("An act of the demo lies in the past, whatever the time of day.");
      moment = today - daysAgo * DAY_MS + Date.parse(`1970-01-01T${time}:00Z`);
    },
  };
}
