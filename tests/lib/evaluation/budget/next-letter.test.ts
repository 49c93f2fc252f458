import { describe, expect, it } from "vitest";
import { FIRST_LETTER, nextLetter } from "@/lib/evaluation/budget/next-letter";

function lettersAfterFirst(count: number): string[] {
  const letters: string[] = [];
  for (let letter = FIRST_LETTER; letters.length < count;) {
    letter = nextLetter(letter);
    letters.push(letter);
  }
  return letters;
}

describe("revision letters", () => {
  it("run from a dash through the twenty letters that ASME Y14.35 admits, then double", () => {
    expect(lettersAfterFirst(23)).toEqual([..."ABCDEFGHJKLMNPRTUVWY", "AA", "AB", "AC"]);
  });

  it("never hold I, O, Q, S, X or Z, in the first place or the second", () => {
    expect(lettersAfterFirst(500).filter((letter) => /[IOQSXZ]/.test(letter))).toEqual([]);
  });

  it("never come twice, and go from AY to BA and from YY to AAA", () => {
    expect(new Set(lettersAfterFirst(500)).size).toBe(500);
    expect(nextLetter("AY")).toBe("BA");
    expect(nextLetter("YY")).toBe("AAA");
  });

  it("have none after what is no revision letter", () => {
    expect(() => nextLetter("I")).toThrow(RangeError);
    expect(() => nextLetter("")).toThrow(RangeError);
  });
});
