import { describe, expect, it } from "vitest";
import { markdownNesting, markdownText, plainText } from "@/lib/proposals/texts";

describe("texts that people write", () => {
  it("refuses Markdown that is nested deeper than fifty levels, in quotes, lists or both", () => {
    const schema = markdownText();
    expect(schema.safeParse("> ".repeat(50) + "deep").success).toBe(true);
    expect(schema.safeParse(">".repeat(51) + "too deep").success).toBe(false);
    expect(schema.safeParse("> - ".repeat(26) + "too deep").success).toBe(false);
    expect(schema.safeParse("a\n" + " ".repeat(102) + "- x").success).toBe(false);
    expect(schema.safeParse("1. ".repeat(51) + "x").success).toBe(false);
  });

  it("counts no nesting in ordinary prose, hyphens and numbers", () => {
    expect(markdownNesting("The strip - 5.8 m long - is 3 > 2.\n\n2.5 N less")).toBe(0);
  });

  it("refuses NUL, half a surrogate pair and more than 20 kB, counted in bytes", () => {
    const schema = markdownText();
    expect(schema.safeParse("a\0b").success).toBe(false);
    expect(schema.safeParse("a\uD800b").success).toBe(false);
    expect(schema.safeParse("smile 🙂 and µ").success).toBe(true);
    expect(schema.safeParse("µ".repeat(10_001)).success).toBe(false);
  });

  it("keeps one kind of line end and refuses a second line where one is asked for", () => {
    expect(markdownText().parse("one\r\ntwo\r")).toBe("one\ntwo");
    expect(plainText(20).safeParse("one\ntwo").success).toBe(false);
  });

  it("says its own sentence when nothing was written", () => {
    expect(markdownText("Write the remark.").safeParse("  ").error?.issues[0]?.message).toBe("Write the remark.");
  });
});
