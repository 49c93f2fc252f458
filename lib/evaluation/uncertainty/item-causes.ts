import type { EvaluatedBody } from "../budget/method-input";
import { TERMS_NUMBER } from "../lines/terms-body";
import type { ItemBody } from "../lines/item-body";
import type { Cause, CauseSketch } from "./cause";

type CausePlace = Omit<CauseSketch, "value" | "standardUncertainty">;
type Plate = Extract<ItemBody, { method: "flat-plate-friction" }>;

/** Fields of a measured item, by the names that the stream of its test has. */
const TEST_FIELDS: Record<string, string> = {
  "testPoint.staticTemperature": "testTemperature",
  "testPoint.staticPressure": "testPressure",
  "testPoint.density": "testDensity",
  "testPoint.dynamicViscosity": "testDynamicViscosity",
  "testPoint.speed": "testSpeed",
};

/** Whose quantity a number of an item's input is: of the item itself, of its finish, or of the product. */
export function inputCause(item: string, body: EvaluatedBody, path: string): CausePlace {
  const limits = limitsOf(path, body.saving);
  if (path === "roughness" && "finish" in body && body.finish !== null) {
    return { origin: "finish", name: body.finish, field: "roughness", ...limits };
  }
  if (path === "flowArea" && body.method === "loss-coefficient" && body.flowArea === null) {
    return { origin: "terms", name: TERMS_NUMBER, field: "flowArea", ...limits };
  }
  const field = path === "transition.at" ? "trippedAt" : (TEST_FIELDS[path] ?? path);
  return { origin: "item", name: item, field, ...limits };
}

/** Between what a quantity can lie: a saving takes away, an altitude has either sign, humidity ends at 1, all else is 0 or greater. */
export function limitsOf(path: string, saving: boolean): Pick<Cause, "lowest" | "highest"> {
  if (path === "pressureAltitude") return { lowest: -Infinity, highest: Infinity };
  if (saving && (path === "force" || path === "dragArea")) return { lowest: -Infinity, highest: 0 };
  return { lowest: 0, highest: path === "relativeHumidity" ? 1 : Infinity };
}

/** The uncertain lengths that make the run-up of a plate behind others: each is one cause with that plate's own. */
export function runUpCauses(plate: Plate, item: string, items: ReadonlyMap<string, ItemBody>): CauseSketch[] {
  const causes: CauseSketch[] = [];
  const add = (name: string, field: "length" | "runUp", body: Plate): void => {
    const { value, standardUncertainty = 0 } = body[field];
    if (standardUncertainty === 0) return;
    causes.push({ origin: "item", name, field, value, standardUncertainty, ...limitsOf(field, false) });
  };
  let [number, current] = [item, plate];
  while (current.runUpFollows && current.liesBehind !== null) {
    const ahead = items.get(current.liesBehind);
    if (ahead?.method !== "flat-plate-friction") break;
    add(current.liesBehind, "length", ahead);
    [number, current] = [current.liesBehind, ahead];
  }
  add(number, "runUp", current);
  return causes;
}
