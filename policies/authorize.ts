import type { Actor } from "@/lib/vocabulary/actor";
import { Refusal } from "@/lib/vocabulary/refusal";
import { abilityFor, covers } from "@/policies/ability";
import { refusalSentence, type Question } from "@/policies/questions";

/** Throws the refusal "forbidden" unless the actor may do this very thing. Asked in the command, on the server. */
export function authorize(actor: Actor, question: Question): void {
  if (!isAllowed(actor, question)) throw new Refusal("forbidden", refusalSentence(question));
}

/** The same question for showing or hiding. */
export function isAllowed(actor: Actor, question: Question): boolean {
  return covers(abilityFor(actor), question);
}
