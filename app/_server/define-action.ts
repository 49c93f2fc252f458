import { unstable_rethrow } from "next/navigation";
import type { z } from "zod";

import type { Actor } from "@/lib/vocabulary/actor";
import { type Clock, systemClock } from "@/lib/vocabulary/clock";
import { type FieldFault, Refusal } from "@/lib/vocabulary/refusal";

import type { ActionResult } from "./action-result";
import { currentActor } from "./session";

/** A command of lib: who acts, what is asked, and the clock that says when. */
export type Command<Input, Value> = (actor: Actor, input: Input, clock: Clock) => Promise<Value>;

/** Ties an input's shape to its command: the one way from a form to a change. */
export function defineAction<Schema extends z.ZodType, Value>(
  schema: Schema,
  command: Command<z.output<Schema>, Value>,
): (input: z.input<Schema>) => Promise<ActionResult<Value>> {
  return async (input) => {
    const actor = await currentActor();
    if (!actor) return refusalResult(new Refusal("forbidden", SIGNED_OUT));

    return runCommand(schema, command, actor, input);
  };
}

const SIGNED_OUT = "You are signed out. Sign in again in another tab, then try again here: nothing typed is lost.";

/** Parses, runs, and turns a "no" into an answer. Anything else that is thrown is a bug and goes on its way. */
export async function runCommand<Schema extends z.ZodType, Value>(
  schema: Schema,
  command: Command<z.output<Schema>, Value>,
  actor: Actor,
  input: unknown,
): Promise<ActionResult<Value>> {
  const parsed = schema.safeParse(input);
  if (!parsed.success) return refusalResult(invalid(parsed.error));

  try {
    return { ok: true, value: await command(actor, parsed.data, systemClock) };
  } catch (error) {
    unstable_rethrow(error);
    if (error instanceof Refusal) return refusalResult(error);
    throw error;
  }
}

/** The faults of a form as a refusal; the sentence is the first of them, so that it stands alone too. */
export function invalid(error: z.ZodError): Refusal {
  const faults: FieldFault[] = error.issues.map(({ path, message }) => ({
    path: path.map(String).join("."),
    sentence: message,
  }));
  const first = faults[0];
  const sentence = faults.length === 1 && first ? first.sentence : `${faults.length} fields need another look.`;

  return new Refusal("invalid", sentence, faults);
}

function refusalResult({ code, message, faults }: Refusal): ActionResult<never> {
  return { ok: false, code, sentence: message, faults };
}
