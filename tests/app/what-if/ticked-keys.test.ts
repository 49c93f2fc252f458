import { describe, expect, it } from "vitest";
import {
  tickedAfter,
  tickedKeys,
  whatIfAddress,
} from "@/app/(workspace)/products/[productCode]/what-if/_components/ticked-keys";

const CANDIDATES = ["4", "7", "12", "draft-3"];
const PATH = "/products/TF2/what-if";

describe("ticking proposals in what if", () => {
  it("adds a tick in the order of the candidates, in whatever order they are ticked", () => {
    expect(tickedAfter(CANDIDATES, [], "12", true)).toEqual(["12"]);
    expect(tickedAfter(CANDIDATES, ["12"], "4", true)).toEqual(["4", "12"]);
    expect(tickedAfter(CANDIDATES, ["4", "12"], "draft-3", true)).toEqual(["4", "12", "draft-3"]);
  });

  it("takes one away and leaves the others, and does nothing twice", () => {
    expect(tickedAfter(CANDIDATES, ["4", "12"], "4", false)).toEqual(["12"]);
    expect(tickedAfter(CANDIDATES, ["12"], "12", true)).toEqual(["12"]);
    expect(tickedAfter(CANDIDATES, ["12"], "4", false)).toEqual(["12"]);
  });

  it("forgets what is no candidate any more: decided meanwhile, or never visible to this reader", () => {
    expect(tickedAfter(CANDIDATES, ["3", "draft-99", "7"], "12", true)).toEqual(["7", "12"]);
    expect(tickedAfter(CANDIDATES, ["7"], "3", true)).toEqual(["7"]);
  });

  it("stands in the address, from which the same ticks are read again", () => {
    const ticked = tickedAfter(CANDIDATES, ["4"], "draft-3", true);
    const address = whatIfAddress(PATH, ticked, "counts");
    expect(address).toBe(`${PATH}?with=4,draft-3&measure=counts`);
    const { searchParams } = new URL(address, "http://127.0.0.1");
    expect(tickedKeys(searchParams.get("with") ?? undefined)).toEqual(ticked);
    expect(whatIfAddress(PATH, [], undefined)).toBe(PATH);
  });

  it("passes over what is no key, counts each once and at most a hundred", () => {
    expect(tickedKeys("4,4,x,0,-1,draft-3,draft-0,4;5")).toEqual(["4", "draft-3"]);
    expect(tickedKeys(["4", "7,12"])).toEqual(["4", "7", "12"]);
    expect(tickedKeys(undefined)).toEqual([]);
    expect(tickedKeys(Array.from({ length: 150 }, (_, at) => String(at + 1)))).toHaveLength(100);
  });
});
