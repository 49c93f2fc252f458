import { describe, expect, it } from "vitest";

import { ownPath } from "@/app/_server/own-path";

describe("where a sign-in leads", () => {
  it("goes on to a page of this application", () => {
    expect(ownPath("/products/TF-2/proposals/4?point=OP-1")).toBe("/products/TF-2/proposals/4?point=OP-1");
  });

  it.each(["https://elsewhere.example", "//elsewhere.example", "/\\elsewhere.example", "/a\nb", "", undefined, ["/x"]])(
    "leads to the day sheet instead of %j",
    (wanted) => {
      expect(ownPath(wanted)).toBe("/");
    },
  );

  it("does not lead back to the sign-in or to a route that is no page", () => {
    expect(ownPath("/sign-in?to=/sign-in")).toBe("/");
    expect(ownPath("/api/auth/signout")).toBe("/");
  });
});
