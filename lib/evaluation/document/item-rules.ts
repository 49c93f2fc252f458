import type { z } from "zod";
import { FULLY_ROUGH_LINE_NAMES } from "@/lib/aero/friction/friction-line-name";

const SAVING_FIELDS: ReadonlyMap<unknown, string> = new Map([
  ["measured", "force"],
  ["fixed", "force"],
  ["drag-area", "dragArea"],
]);

const FRICTION_METHODS: readonly unknown[] = ["flat-plate-friction", "duct-entry"];

/** Rules between the fields of one item. They look at raw input, so that they are told beside other faults. */
export function checkItemRules(item: unknown, context: z.RefinementCtx): void {
  if (typeof item !== "object" || item === null) return;
  const fields = new Map<string, unknown>(Object.entries(item));
  const fault = (path: PropertyKey[], message: string): void => context.addIssue({ code: "custom", path, message });

  checkSaving(fields, fault);
  checkRoughness(fields, fault);
  if (fields.get("method") === "share") checkMembers(fields, fault);
}

type Fields = ReadonlyMap<string, unknown>;
type Fault = (path: PropertyKey[], message: string) => void;

function checkSaving(fields: Fields, fault: Fault): void {
  const field = SAVING_FIELDS.get(fields.get("method"));
  if (field === undefined) return;
  const number = rawNumber(fields.get(field));
  if (number === undefined) return;
  const path = pathOf(field, fields.get(field));
  if (fields.get("saving") === true) {
    if (number > 0) fault(path, "must be 0 or less for a saving");
  } else if (number < 0) {
    fault(path, 'must be 0 or greater unless "saving" is true');
  }
}

function checkRoughness(fields: Fields, fault: Fault): void {
  if (!FRICTION_METHODS.includes(fields.get("method"))) return;
  const line = fields.get("frictionLine");
  if (typeof line !== "string" || !FULLY_ROUGH_LINE_NAMES.includes(line)) return;
  const roughness = fields.get("roughness");
  const number = roughness === undefined ? 0 : rawNumber(roughness);
  if (number === undefined || number < 0) return;
  const path = pathOf("roughness", roughness);
  if (number === 0) fault(path, "must be greater than 0");
  else if (number < 1e-12) fault(path, "must be at least 1e-12");
}

function checkMembers(fields: Fields, fault: Fault): void {
  const of = fields.get("of");
  const ofGroup = fields.get("ofGroup");
  if (of === undefined && ofGroup === undefined) fault(["of"], "is required, or ofGroup in its place");
  if (of !== undefined && ofGroup !== undefined) fault(["ofGroup"], "must not stand beside of: give one of the two");
  if (!Array.isArray(of)) return;
  of.forEach((id: unknown, index) => {
    if (of.indexOf(id) < index) fault(["of", index], "is named twice");
  });
}

function rawNumber(raw: unknown): number | undefined {
  if (typeof raw === "number") return raw;
  if (typeof raw === "object" && raw !== null && "value" in raw && typeof raw.value === "number") return raw.value;
  return undefined;
}

function pathOf(field: string, raw: unknown): string[] {
  return typeof raw === "object" ? [field, "value"] : [field];
}
