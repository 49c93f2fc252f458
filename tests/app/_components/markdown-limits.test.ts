import { describe, expect, it } from "vitest";

import { isTooMuchMarkdown } from "@/app/_components/markdown-limits";

describe("text that is shown as typed instead of drawn", () => {
  it("draws what people write", () => {
    expect(isTooMuchMarkdown("# Why\n\n- one\n  - two\n\n> quoted\n\n| a | b |\n|---|---|\n| 1 | 2 |")).toBe(false);
  });

  it.each([
    ["thousands of nested quotes", ">".repeat(2500)],
    ["thousands of nested lists", "- ".repeat(2500)],
    ["thousands of nested numbers", "1. ".repeat(2500)],
    ["thousands of open brackets", "[".repeat(2500)],
    ["more than twenty thousand characters", "x".repeat(20_001)],
  ])("does not draw %s", (_what, text) => {
    expect(isTooMuchMarkdown(text)).toBe(true);
  });
});
