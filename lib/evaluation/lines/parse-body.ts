import type { z } from "zod";
import type { LineKind } from "@/lib/vocabulary/lines";
import type { FieldFault } from "@/lib/vocabulary/refusal";
import { AllocationsBody } from "./allocations-body";
import { FinishBody } from "./finish-body";
import { GroupBody } from "./group-body";
import { ItemBody } from "./item-body";
import type { LineContent } from "./line-state";
import { OperatingPointBody } from "./operating-point-body";
import { TermsBody } from "./terms-body";

export type ParsedBody = { ok: true; content: LineContent } | { ok: false; faults: FieldFault[] };

/** A body from outside (a form, a draft, the database): its typed content, or every fault at its own field. */
export function parseBody(kind: LineKind, json: unknown): ParsedBody {
  switch (kind) {
    case "item":
      return parsed(ItemBody, json, (body) => ({ kind, body }));
    case "group":
      return parsed(GroupBody, json, (body) => ({ kind, body }));
    case "operating_point":
      return parsed(OperatingPointBody, json, (body) => ({ kind, body }));
    case "finish":
      return parsed(FinishBody, json, (body) => ({ kind, body }));
    case "allocations":
      return parsed(AllocationsBody, json, (body) => ({ kind, body }));
    case "terms":
      return parsed(TermsBody, json, (body) => ({ kind, body }));
  }
}

function parsed<Body>(schema: z.ZodType<Body>, json: unknown, toContent: (body: Body) => LineContent): ParsedBody {
  const result = schema.safeParse(json);
  if (result.success) return { ok: true, content: toContent(result.data) };
  return { ok: false, faults: result.error.issues.flatMap(faultsOf) };
}

function faultsOf(issue: z.core.$ZodIssue): FieldFault[] {
  if (issue.code === "unrecognized_keys") {
    return issue.keys.map((key) => ({ path: [...issue.path, key].join("."), sentence: "Is no field of this line." }));
  }
  // A quantity is one field on every form: its fault stands at the field, not at the number inside.
  const path = issue.path.at(-1) === "value" ? issue.path.slice(0, -1) : issue.path;
  return [{ path: path.join("."), sentence: issue.message }];
}
