import type { z } from "zod";

import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal, type RefusalCode } from "@/lib/vocabulary/refusal";

import type { ActionResult } from "./action-result";
import { type Command, runCommand } from "./define-action";
import { isForeignWrite } from "./request-limits";
import { currentActor } from "./session";

const STATUS: Record<RefusalCode, number> = {
  forbidden: 403,
  not_found: 404,
  invalid: 400,
  wrong_state: 409,
  overtaken: 409,
  moved: 409,
  unsettled_request: 409,
  not_independent: 403,
  capacity_taken: 409,
  wrong_password: 403,
  conservation: 422,
  evaluation_refused: 422,
  justification_missing: 422,
  evidence_missing: 422,
  duplicate: 409,
  too_large: 413,
  too_many_attempts: 429,
};

/** A refusal as an answer with its status: `{ code, sentence, faults }`. */
export function refusalResponse({ code, message, faults }: Refusal): Response {
  return problem(STATUS[code], { code, sentence: message, faults });
}

/** Answers a read for the signed-in person; a refusal becomes its status. */
export async function answerRead<Value>(read: (actor: Actor) => Promise<Value>): Promise<Response> {
  const actor = await currentActor();
  if (!actor) return signedOut();

  try {
    return Response.json(await read(actor), { headers: { "cache-control": "no-store" } });
  } catch (error) {
    if (error instanceof Refusal) return refusalResponse(error);
    throw error;
  }
}

export interface FileAnswer {
  name: string;
  /** Media type. */
  type: string;
  body: string | Uint8Array<ArrayBuffer>;
}

/** Answers a read for the signed-in person with a file to keep. */
export async function answerFile(read: (actor: Actor) => Promise<FileAnswer>): Promise<Response> {
  const actor = await currentActor();
  if (!actor) return signedOut();

  try {
    const { name, type, body } = await read(actor);
    return new Response(body, {
      headers: {
        "content-type": type,
        "content-disposition": `attachment; filename="${name}"`,
        "x-content-type-options": "nosniff",
        "cache-control": "no-store",
      },
    });
  } catch (error) {
    if (error instanceof Refusal) return refusalResponse(error);
    throw error;
  }
}

/** Answers a write: same origin, signed in, parsed, then the command. */
export async function answerWrite<Schema extends z.ZodType, Value>(
  request: Request,
  schema: Schema,
  command: Command<z.output<Schema>, Value>,
): Promise<Response> {
  const write = await readWrite(request);
  if (write instanceof Response) return write;

  return resultResponse(await runCommand(schema, command, write.actor, write.body));
}

/** Who writes what; or the answer to a write that is none. */
export async function readWrite(request: Request): Promise<{ actor: Actor; body: unknown } | Response> {
  if (isForeignWrite(request))
    return refusalResponse(new Refusal("forbidden", "This did not come from a page of ours."));

  const actor = await currentActor();
  if (!actor) return signedOut();

  const body = await readJson(request);
  if (body === undefined) return refusalResponse(new Refusal("invalid", "This is no JSON text, or it is too long."));

  return { actor, body };
}

/** Longest body of a write: 512 KiB of JSON. */
const LONGEST_TEXT = 524_288;

async function readJson(request: Request): Promise<unknown> {
  const text = await request.text();
  if (text.length > LONGEST_TEXT) return undefined;

  try {
    return JSON.parse(text);
  } catch {
    return undefined;
  }
}

/** What a command answered, as an answer with its status. */
export function resultResponse(result: ActionResult<unknown>): Response {
  if (result.ok) return Response.json(result.value ?? null, { headers: { "cache-control": "no-store" } });
  const { code, sentence, faults } = result;

  return problem(STATUS[code], { code, sentence, faults });
}

export function signedOut(): Response {
  return problem(401, { code: "forbidden", sentence: "You are signed out. Sign in again.", faults: [] });
}

function problem(status: number, body: object): Response {
  return Response.json(body, { status, headers: { "cache-control": "no-store" } });
}
