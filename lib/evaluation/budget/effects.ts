import type { Standing } from "@/lib/vocabulary/standing";
import type { Note } from "../notes/note";

/** What a change does to one item at one operating point, newtons; null on the side where it has no result. */
export interface ItemEffect {
  item: string;
  operatingPoint: string;
  edited: boolean;
  basicWas: number | null;
  basicNow: number | null;
  predictedWas: number | null;
  predictedNow: number | null;
  basicDelta: number;
  predictedDelta: number;
  newNotes: Note[];
  vanishedNotes: Note[];
  /** Newly refused by this change. */
  refusedNow: Note | null;
}

export interface PointFigures {
  limitHundredths: number;
  reserveHundredths: number;
  basic: number;
  growth: number;
  predicted: number;
  margin: number;
  clearOfReserve: number;
  standing: Standing;
}

export interface PointEffect {
  operatingPoint: string;
  name: string;
  /** null where the change adds the operating point. */
  was: PointFigures | null;
  /** null where the change retires it. */
  now: PointFigures | null;
  predictedDelta: number;
  marginDelta: number;
}

export interface Effects {
  points: PointEffect[];
  /** Items that moved, gained or lost a note, or were edited: per item and operating point. */
  items: ItemEffect[];
  /** The part of `items` that nobody edited. */
  followers: ItemEffect[];
}
