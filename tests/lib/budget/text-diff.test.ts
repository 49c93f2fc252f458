import { describe, expect, it } from "vitest";
import { textDiff } from "@/lib/budget/text-diff";

/** No line of the one is among the other's: nothing is harder to compare. */
const lines = (word: string, count: number) => Array.from({ length: count }, (_, at) => `${word} ${at}`).join("\n");

describe("two texts line by line", () => {
  it("say of each line whether it stands in both, stood before, or is new", () => {
    expect(textDiff("Bench sheet seen.\nK is 0.22.\nSigned.", "Bench sheet seen.\nK is 0.19.\nSigned.")).toEqual([
      { side: "both", text: "Bench sheet seen." },
      { side: "was", text: "K is 0.22." },
      { side: "toBe", text: "K is 0.19." },
      { side: "both", text: "Signed." },
    ]);
  });

  it("give both texts back: what is not new is the old one, what did not stand before is the new one", () => {
    const [was, toBe] = ["a\n\nb\nc\nd", "b\n\na\nc\ne\nf"];
    const rows = textDiff(was, toBe) ?? [];
    const side = (left: "was" | "toBe") =>
      rows
        .filter((row) => row.side !== left)
        .map(({ text }) => text)
        .join("\n");
    expect([side("toBe"), side("was")]).toEqual([was, toBe]);
  });

  it("do not differ by who typed the line ends, or by a last one", () => {
    expect(textDiff("a\r\nb\r\n", "a\nb")).toEqual([
      { side: "both", text: "a" },
      { side: "both", text: "b" },
    ]);
  });

  it("are given up when they differ too much to be compared in time", () => {
    const started = performance.now();
    expect(textDiff(lines("old", 20_000), lines("new", 20_000), 20)).toBeNull();
    // The whole comparison takes seconds; the limit is looked at between steps.
    expect(performance.now() - started).toBeLessThan(1000);
  });
});
