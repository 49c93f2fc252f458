import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  firstWindow,
  MOST_ROWS,
  rowWindow,
} from "@/app/(workspace)/products/[productCode]/budget/_components/row-window";

const COUNT = 513;
const SCREEN = 900;

function windowAt(top: number, more: { kept?: number[]; known?: number; heightOf?: (place: number) => number } = {}) {
  const { kept = [], known = COUNT, heightOf = () => 50 } = more;
  return rowWindow({ count: COUNT, known, heightOf, top, bottom: top + SCREEN, kept });
}

const heights = fc.array(fc.integer({ min: 30, max: 140 }), { minLength: COUNT, maxLength: COUNT });

describe("the rows of a long table that stand in the document", () => {
  it("are those in view and some around them, never more than 40 beside the one with the focus", () => {
    fc.assert(
      fc.property(heights, fc.integer({ min: -2000, max: 70_000 }), fc.nat(COUNT - 1), (each, top, focus) => {
        const { shown } = windowAt(top, { heightOf: (place) => each[place] ?? 0, kept: [focus] });
        let reached = 0;
        for (const [place, height] of each.entries()) {
          const isSeen = reached + height > top && reached < top + SCREEN;
          if (isSeen) expect(shown).toContain(place);
          reached += height;
        }
        expect(shown).toContain(focus);
        expect(shown.length).toBeLessThanOrEqual(MOST_ROWS + 1);
      }),
      { numRuns: 200 },
    );
  });

  it("leave the room of all others, so that the page keeps its length", () => {
    fc.assert(
      fc.property(heights, fc.integer({ min: -2000, max: 70_000 }), fc.nat(COUNT - 1), (each, top, focus) => {
        const { shown, gaps } = windowAt(top, { heightOf: (place) => each[place] ?? 0, kept: [focus] });
        const sum = (parts: readonly number[]) => parts.reduce((total, part) => total + part, 0);
        expect(gaps).toHaveLength(shown.length + 1);
        expect(sum(gaps) + sum(shown.map((place) => each[place] ?? 0))).toBeCloseTo(sum(each), 6);
      }),
      { numRuns: 200 },
    );
  });

  it("hold the row with the focus wherever the page was scrolled", () => {
    const { shown, gaps } = windowAt(20_000, { kept: [3] });

    expect(shown[0]).toBe(3);
    expect(gaps[0]).toBe(150);
    expect(shown).toContain(400);
  });

  it("are none where the rows in view were not read yet, and their room is kept", () => {
    const { shown, gaps } = windowAt(20_000, { known: 40 });

    expect(shown).toEqual([]);
    expect(gaps).toEqual([COUNT * 50]);
  });

  it("are at first what the server sent", () => {
    expect(firstWindow(COUNT, 40).shown).toEqual(Array.from({ length: 40 }, (_, place) => place));
    expect(firstWindow(12, 12)).toEqual({
      shown: Array.from({ length: 12 }, (_, place) => place),
      gaps: Array(13).fill(0),
    });
  });
});
