/** Rows that may stand in the document at once; a list up to this length stands whole. */
export const MOST_ROWS = 40;
/** Rows of a long list that the server sends. */
export const FIRST_ROWS = 40;
/** px of a row that was not seen yet, before any was. */
const FIRST_HEIGHT = 56;

/** Which rows of a long list stand in the document, and how much room the others leave. */
export interface RowWindow {
  /** Places of the rows, in order. */
  shown: readonly number[];
  /** px that are left ahead of each of them, and after the last. */
  gaps: readonly number[];
}

export interface RowsInView {
  count: number;
  /** Rows whose content is known: the first so many. */
  known: number;
  /** px of a row that was measured. */
  heightOf: (place: number) => number | undefined;
  /** px from the top of the first row to the upper and the lower edge of what is seen. */
  top: number;
  bottom: number;
  /** Places of rows that stay whatever is seen: where the focus is. */
  kept: readonly number[];
}

/** What the server sends, before anything is measured. */
export function firstWindow(count: number, known: number): RowWindow {
  return windowOf(
    Array.from({ length: Math.min(count, known) }, (_, place) => place),
    Array.from({ length: count }, () => FIRST_HEIGHT),
  );
}

/** The rows in view with as many again around them as there is room for. */
export function rowWindow({ count, known, heightOf, top, bottom, kept }: RowsInView): RowWindow {
  const heights = heightsOf(count, heightOf);
  const [from, until] = placesSeen(heights, top, bottom);
  const spare = Math.max(0, MOST_ROWS - (until - from));
  const start = Math.max(0, Math.min(from - Math.floor(spare / 2), count - MOST_ROWS));
  const end = Math.min(count, Math.max(until, start + MOST_ROWS));
  const places = new Set(kept.filter((place) => place >= 0 && place < count));
  for (let place = start; place < end; place += 1) places.add(place);
  const shown = [...places].filter((place) => place < known).sort((one, other) => one - other);
  return windowOf(shown, heights);
}

export function isSameWindow(one: RowWindow, other: RowWindow): boolean {
  return (
    one.shown.length === other.shown.length &&
    one.shown.every((place, at) => place === other.shown[at]) &&
    one.gaps.every((gap, at) => Math.abs(gap - (other.gaps[at] ?? 0)) < 1)
  );
}

/** Top of a row, px below the top of the first. */
export function topOf(place: number, { count, heightOf }: Pick<RowsInView, "count" | "heightOf">): number {
  return sumOf(heightsOf(count, heightOf), 0, place);
}

/** A row that was not measured is taken to be as high as those that were, on average. */
function heightsOf(count: number, heightOf: RowsInView["heightOf"]): number[] {
  const measured = Array.from({ length: count }, (_, place) => heightOf(place));
  const known = measured.filter((height) => height !== undefined);
  const usual = known.length === 0 ? FIRST_HEIGHT : known.reduce((sum, height) => sum + height, 0) / known.length;
  return measured.map((height) => height ?? usual);
}

/** The first place in view, and the one after the last. */
function placesSeen(heights: readonly number[], top: number, bottom: number): [number, number] {
  let reached = 0;
  let from = heights.length;
  let until = heights.length;
  for (const [place, height] of heights.entries()) {
    if (reached + height > top) from = Math.min(from, place);
    if (reached >= bottom) {
      until = place;
      break;
    }
    reached += height;
  }
  return [Math.min(from, until), until];
}

function windowOf(shown: readonly number[], heights: readonly number[]): RowWindow {
  const ends = [...shown, heights.length];
  const gaps = ends.map((place, at) => sumOf(heights, (ends[at - 1] ?? -1) + 1, place));
  return { shown, gaps };
}

function sumOf(heights: readonly number[], from: number, until: number): number {
  let sum = 0;
  for (let place = from; place < until; place += 1) sum += heights[place] ?? 0;
  return sum;
}
