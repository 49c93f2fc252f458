import { describe, expect, it } from "vitest";
import { chosenMeasure, readingFor } from "@/app/(workspace)/_measures/chosen-measure";
import type { MeasureBasis } from "@/lib/evaluation/measures/measure-basis";

const CAR: MeasureBasis = {
  kind: "vehicle_fairing",
  countSize: 0.001,
  referenceArea: 10,
  flowArea: null,
  dynamicPressure: 382.8125,
  speed: 25,
  hoursPerYear: 1000,
};
const DUCT: MeasureBasis = { ...CAR, kind: "duct", referenceArea: null, flowArea: 3 };
const SI = { measure: "newtons", units: "si" } as const;

describe("the measure of a page", () => {
  it("is the address's, else the person's, else newtons", () => {
    expect(chosenMeasure("counts", { ...SI, measure: "power" }, [CAR])).toMatchObject({ measure: "counts" });
    expect(chosenMeasure(undefined, { ...SI, measure: "power" }, [CAR])).toMatchObject({ measure: "power" });
    expect(chosenMeasure(undefined, SI, [CAR])).toMatchObject({ measure: "newtons", refusal: null });
  });

  it("is newtons, without a word, where the product lacks the measure that the person keeps", () => {
    expect(chosenMeasure(undefined, { ...SI, measure: "counts" }, [DUCT])).toMatchObject({
      measure: "newtons",
      offered: ["newtons", "drag-area", "pascals"],
      refusal: null,
    });
  });

  it("is newtons, and says why, where the address asks for a measure that is not there", () => {
    expect(chosenMeasure("counts", SI, [DUCT])).toMatchObject({
      measure: "newtons",
      refusal: expect.stringMatching(/no reference area.*Forces are shown instead/) as string,
    });
    expect(chosenMeasure("furlongs", SI, [CAR]).refusal).toMatch(/“furlongs” is no measure/);
  });

  it("offers on a page of several products what any of them has; a product without it stays in newtons", () => {
    const chosen = chosenMeasure("counts", SI, [DUCT, CAR]);
    expect(chosen.measure).toBe("counts");
    expect(chosenMeasure("counts", SI, [DUCT, DUCT]).refusal).toMatch(/None of these products/);
    expect(readingFor(chosen, CAR).unit).toBe("counts");
    expect(readingFor(chosen, DUCT).unit).toBe("N");
    expect(readingFor({ ...chosen, units: "us" }, DUCT).unit).toBe("lbf");
  });
});
