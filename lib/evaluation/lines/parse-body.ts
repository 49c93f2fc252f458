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
import { typedTextFaults, unreadTextSentence } from "./typed-quantities";

export type ParsedBody = { ok: true; content: LineContent } | { ok: false; faults: FieldFault[] };

/** A body from outside (a form, a draft, the database): its typed content, or every fault at its own field. */
export function parseBody(kind: LineKind, json: unknown): ParsedBody {
  switch (kind) {
    case "item":
      return parsed(kind, ItemBody, json, (body) => ({ kind, body }));
    case "group":
      return parsed(kind, GroupBody, json, (body) => ({ kind, body }));
    case "operating_point":
      return parsed(kind, OperatingPointBody, json, (body) => ({ kind, body }));
    case "finish":
      return parsed(kind, FinishBody, json, (body) => ({ kind, body }));
    case "allocations":
      return parsed(kind, AllocationsBody, json, (body) => ({ kind, body }));
    case "terms":
      return parsed(kind, TermsBody, json, (body) => ({ kind, body }));
  }
}

function parsed<Body extends object>(
  kind: LineKind,
  schema: z.ZodType<Body>,
  json: unknown,
  toContent: (body: Body) => LineContent,
): ParsedBody {
  const result = schema.safeParse(json);
  if (!result.success)
    return { ok: false, faults: result.error.issues.flatMap((issue) => faultsOf(issue, kind, json)) };

  const faults = typedTextFaults(kind, result.data);
  return faults.length === 0 ? { ok: true, content: toContent(result.data) } : { ok: false, faults };
}

function faultsOf(issue: z.core.$ZodIssue, kind: LineKind, json: unknown): FieldFault[] {
  if (issue.code === "unrecognized_keys") {
    return issue.keys.map((key) => ({ path: [...issue.path, key].join("."), sentence: "Is no field of this line." }));
  }
  if (issue.path.at(-1) !== "value") return [{ path: issue.path.join("."), sentence: issue.message }];
  // A quantity is one field on every form: its fault stands at the field, not at the number inside.
  const path = issue.path.slice(0, -1).join(".");
  return [{ path, sentence: unreadTextSentence(kind, json, path) ?? issue.message }];
}
