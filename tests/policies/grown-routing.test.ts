import fc from "fast-check";
import { expect, it } from "vitest";
import { grownRouting, type RequiredCapacity } from "@/policies/approval-routing";

const reasons = fc
  .subarray(["terms", "limit", "finish", "allocations"] as const)
  .map((rules) => rules.map((rule) => ({ rule, sentence: `It touches ${rule}.` })));
const capacity = (name: RequiredCapacity["capacity"]) =>
  fc.record({
    capacity: fc.constant(name),
    count: fc.integer({ min: 1, max: 3 }),
    reasons,
    signedBySubmitting: fc.boolean(),
  });
const routing = fc
  .tuple(capacity("reviewer"), fc.option(capacity("program_manager")))
  .map(([reviewer, manager]): RequiredCapacity[] => (manager ? [reviewer, manager] : [reviewer]));

it("keeps what any signer of a round saw asked for: no capacity, count or reason goes, whatever comes after", () => {
  fc.assert(
    fc.property(routing, fc.array(routing, { minLength: 1, maxLength: 6 }), (first, later) => {
      const seen: RequiredCapacity[][] = [first];
      let grown = first;
      for (const now of later) {
        seen.push(now);
        grown = grownRouting(grown, now);
        for (const required of seen.flat()) {
          const found = grown.find((each) => each.capacity === required.capacity);
          expect(found?.count).toBeGreaterThanOrEqual(required.count);
          expect(found?.reasons).toEqual(expect.arrayContaining(required.reasons));
          // Nobody signs by submitting who did not from the first moment to the last.
          expect(found?.signedBySubmitting === true && !required.signedBySubmitting).toBe(false);
        }
      }
      expect(new Set(grown.map((each) => each.capacity)).size).toBe(grown.length);
    }),
  );
});
