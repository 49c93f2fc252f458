import { airCondition } from "@/lib/aero/fluids/air-condition";
import type { BudgetState, LineState } from "../lines/line-state";
import type { OperatingPointBody } from "../lines/operating-point-body";
import type { Quantity } from "../lines/quantity";

/** The budget with one operating point at another speed: times `factor`. */
export function withSpeed(state: BudgetState, operatingPoint: string, factor: number): BudgetState {
  return withPoint(state, operatingPoint, (body) => ({ ...body, speed: times(body.speed, factor) }));
}

/**
 * The budget with one operating point `kelvins` warmer at the same pressure; null where its fluid is stated by density
 * and viscosity and so has no temperature.
 */
export function withTemperature(state: BudgetState, operatingPoint: string, kelvins: number): BudgetState | null {
  const line = state.lines.find(({ kind, number }) => kind === "operating_point" && number === operatingPoint);
  const temperature = line?.kind === "operating_point" ? temperatureOf(line.body) : null;
  if (temperature === null) return null;
  const staticTemperature = { value: temperature + kelvins };
  return withPoint(state, operatingPoint, (body) => ({ ...body, staticTemperature }));
}

/** The budget with every roughness times `factor`: of the finishes and of the surfaces that state their own. */
export function withRoughness(state: BudgetState, factor: number): BudgetState {
  return withLines(state, (line) => {
    if (line.kind === "finish")
      return { ...line, body: { ...line.body, roughness: times(line.body.roughness, factor) } };
    if (line.kind !== "item") return line;
    const { body } = line;
    if ((body.method !== "flat-plate-friction" && body.method !== "duct-entry") || body.roughness === null) return line;
    return { ...line, body: { ...body, roughness: times(body.roughness, factor) } };
  });
}

/** The budget with every drag coefficient times `factor`: of the bluff bodies and inside the drag areas. */
export function withDragCoefficients(state: BudgetState, factor: number): BudgetState {
  return withLines(state, (line) => {
    if (line.kind !== "item") return line;
    const { body } = line;
    switch (body.method) {
      case "bluff-body":
        return { ...line, body: { ...body, dragCoefficient: body.dragCoefficient * factor } };
      case "drag-area":
        return { ...line, body: { ...body, dragArea: times(body.dragArea, factor) } };
      default:
        return line;
    }
  });
}

/** In air that is stated by its altitude alone the standard atmosphere's temperature holds. */
function temperatureOf(body: OperatingPointBody): number | null {
  if (body.fluid === "custom") return null;
  if (body.staticTemperature !== null) return body.staticTemperature.value;
  const condition = airCondition({
    staticTemperature: undefined,
    staticPressure: body.staticPressure?.value,
    pressureAltitude: body.pressureAltitude?.value,
  });
  return condition?.staticTemperature ?? null;
}

function withPoint(
  state: BudgetState,
  operatingPoint: string,
  vary: (body: OperatingPointBody) => OperatingPointBody,
): BudgetState {
  return withLines(state, (line) =>
    line.kind === "operating_point" && line.number === operatingPoint ? { ...line, body: vary(line.body) } : line,
  );
}

function withLines(state: BudgetState, vary: (line: LineState) => LineState): BudgetState {
  return { ...state, lines: state.lines.map(vary) };
}

function times(quantity: Quantity, factor: number): Quantity {
  return { value: quantity.value * factor };
}
