import { describe, expect, it } from "vitest";
import {
  fieldOfFault,
  readEstablishment,
} from "@/app/(workspace)/products/[productCode]/establish/_components/establish-input";
import { newEstablishValues } from "@/app/(workspace)/products/[productCode]/establish/_components/establish-values";
import { firstIssueLines } from "@/lib/products/first-issue";
import { EstablishProductInput } from "@/lib/products/schema";

const product = { code: "TF-2", timeZone: "Europe/Amsterdam" };
const filled = { ...newEstablishValues(), name: "motorway", speed: "90 km/h", limit: "66 N", reserve: "3 N" };

describe("the form that establishes a product", () => {
  it("gives what the act takes: SI values beside the typed text, limit and reserve in hundredths", () => {
    const { input, faults } = readEstablishment(filled, product);
    const parsed = EstablishProductInput.parse({ ...input, password: "long enough" });
    const lines = firstIssueLines("vehicle_fairing", parsed);

    expect(faults).toEqual({});
    expect(lines.find(({ kind }) => kind === "operating_point")?.body).toMatchObject({
      speed: { value: 25, entered: "90 km/h" },
      staticTemperature: { value: 288.15 },
      limitHundredths: 6600,
    });
    expect(lines.find(({ kind }) => kind === "allocations")?.body).toEqual({ rows: [], unallocatedHundredths: 6300 });
    expect(lines.find(({ kind }) => kind === "terms")?.body).toMatchObject({
      growthTable: { estimated: 0.2, layout: 0.15, measured_actual: 0 },
      timeZone: "Europe/Amsterdam",
    });
  });

  it("says at the field what cannot be read", () => {
    const values = {
      ...filled,
      limit: "66 kg",
      reserve: "",
      speed: "fast",
      growth: { ...filled.growth, layout: "much" },
    };
    const { faults } = readEstablishment(values, product);

    expect(Object.keys(faults).sort()).toEqual(["growth.layout", "limit", "reserve", "speed"]);
    expect(faults.limit).toContain("a force is needed");
  });

  it("asks for limits to whole hundredths of a newton", () => {
    expect(readEstablishment({ ...filled, limit: "66.005 N" }, product).faults.limit).toContain("0.01 N");
    expect(readEstablishment({ ...filled, limit: "66.07 N" }, product).faults.limit).toBeUndefined();
  });

  it("asks of a custom fluid its density and viscosity, and of water no pressure", () => {
    const custom = { ...filled, fluid: "custom", density: "998 kg/m³", dynamicViscosity: "0.001 Pa·s" };
    expect(readEstablishment(custom, product).input.operatingPoint.body).toMatchObject({
      staticTemperature: null,
      staticPressure: null,
      density: { value: 998 },
    });
    expect(readEstablishment({ ...filled, fluid: "fresh-water" }, product).input.operatingPoint.body).toMatchObject({
      staticPressure: null,
    });
  });

  it("puts the faults of the act at its own fields", () => {
    expect(fieldOfFault("operatingPoint.body.speed")).toBe("speed");
    expect(fieldOfFault("operatingPoint.body.limitHundredths")).toBe("limit");
    expect(fieldOfFault("terms.reserves")).toBe("reserve");
    expect(fieldOfFault("terms.growthTable.released")).toBe("growth.released");
    expect(fieldOfFault("password")).toBeNull();
  });
});
