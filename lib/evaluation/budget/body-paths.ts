import type { LineKind } from "@/lib/vocabulary/lines";
import { fieldsOfBody } from "../lines/field-catalogue";
import { valuesOf } from "../lines/field-rows";
import type { FieldSpec } from "../lines/field-spec";
import { sameBody } from "../lines/same-body";

/** Paths of the fields in which two bodies differ, in the order of the form; records are told field by field. */
export function changedPaths(kind: LineKind, was: object, now: object): string[] {
  const specs = fieldsOfBody(kind, now);
  const left = Object.keys(was).filter((key) => !specs.some((spec) => spec.key === key));
  return [
    ...specs.flatMap((spec) => pathsOf(spec, "", valuesOf(was).get(spec.key), valuesOf(now).get(spec.key))),
    ...left,
  ];
}

/** The body with the value of one path taken over from another. */
export function withPathFrom(body: object, source: object, path: string): Record<string, unknown> {
  const [key = "", ...rest] = path.split(".");
  const taken = valuesOf(source).get(key);
  const current = valuesOf(body).get(key);
  const isInside = rest.length > 0 && isRecord(taken) && isRecord(current);
  const value = isInside ? withPathFrom(current, taken, rest.join(".")) : taken;
  const others = Object.entries(body).filter(([name]) => name !== key);
  return Object.fromEntries(value === undefined ? others : [...others, [key, value]]);
}

function pathsOf(spec: FieldSpec, prefix: string, was: unknown, now: unknown): string[] {
  if (sameBody(was, now)) return [];
  const path = `${prefix}${spec.key}`;
  if (spec.type.type !== "record" || !isRecord(was) || !isRecord(now)) return [path];
  const [before, after] = [valuesOf(was), valuesOf(now)];
  return spec.type.of.flatMap((part) => pathsOf(part, `${path}.`, before.get(part.key), after.get(part.key)));
}

function isRecord(value: unknown): value is object {
  return typeof value === "object" && value !== null && !Array.isArray(value);
}
