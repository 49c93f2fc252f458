import type { DraftEdit } from "@/lib/proposals/schema";

/** A body as it is typed: complete or not. */
export type Body = NonNullable<DraftEdit["body"]>;
export type Json = Body[string];

/** The body with one field set. */
export function withField(body: Body, key: string, value: Json): Body {
  return { ...body, [key]: value };
}

export function asRecord(value: unknown): Body {
  if (typeof value !== "object" || value === null || Array.isArray(value)) return {};

  return Object.fromEntries(Object.entries(value).map(([key, part]) => [key, toJson(part)]));
}

export function asList(value: unknown): Body[] {
  return Array.isArray(value) ? value.map(asRecord) : [];
}

/** A value as JSON keeps it. */
export function toJson(value: unknown): Json {
  if (value === undefined) return null;
  const json: Json = JSON.parse(JSON.stringify(value));

  return json;
}
