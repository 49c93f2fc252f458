/** How often each race is run. */
export const TIMES = 50;

/** Titles of the drafts that two persons do something to at one moment. */
export const RACES = {
  submits: "Two editors submit it",
  carries: "Two editors carry it forward",
} as const;
