import { AUTOMATIC_RANGE } from "@/lib/aero/friction/automatic-layer";
import { BLASIUS_RANGE } from "@/lib/aero/friction/blasius";
import { frictionBetween } from "@/lib/aero/friction/friction-between";
import { frictionLayer } from "@/lib/aero/friction/friction-layer";
import { PRANDTL_SCHLICHTING } from "@/lib/aero/friction/prandtl-schlichting";
import { isBelow, isBeyond } from "@/lib/aero/friction/transition";
import { within } from "@/lib/aero/range";
import type { Note, NoteValues } from "../notes/note";
import { makeNote } from "../notes/note-catalogue";
import type { FrictionAnswer } from "./friction-answer";
import type { FrictionCase, FrictionSetup } from "./friction-setup";
import { streamNotes } from "./stream-notes";
import type { StreamState } from "./stream-state";

interface FrictionFacts {
  friction: FrictionCase;
  setup: FrictionSetup;
  answer: FrictionAnswer;
  newtonsPerMetre: number;
  isThicknessBorrowed: boolean;
  stream: StreamState;
}

/** Everything that is to be said of a layer's friction. */
export function frictionNotes(facts: FrictionFacts): Note[] {
  const notes: Note[] = [];
  addRangeNotes(facts, notes);
  addLaminarNotes(facts, notes);
  addRoughnessNotes(facts, notes);
  notes.push(...streamNotes(facts.stream));
  if (facts.friction.frictionLine === "automatic") addAutomaticNotes(facts, notes);
  else addNamedLineNotes(facts, notes);
  if (facts.isThicknessBorrowed) {
    notes.push(makeNote("thickness-by-wall-and-wake", { line: facts.answer.frictionLineUsed }));
  }
  return notes;
}

/** Laminar because it was asked to be, not because the critical Re is not reached. */
function isHeldLaminar({ friction, setup }: FrictionFacts): boolean {
  if (setup.transition.kind === "never") return true;
  return friction.transition.kind === "tripped" && isLaminarAtEnd(setup);
}

function isLaminarAtEnd({ transition, endReynolds }: FrictionSetup): boolean {
  if (transition.kind === "at") return !isBeyond(endReynolds, transition.reynolds);
  return transition.kind === "never";
}

function addRangeNotes(facts: FrictionFacts, notes: Note[]): void {
  const { friction, setup, answer } = facts;
  if (isHeldLaminar(facts)) return;
  const reynolds = setup.endReynolds;
  const asked = friction.frictionLine;
  const { min, max } = asked === "automatic" ? AUTOMATIC_RANGE : friction.lines[asked].reynoldsRange;
  if (isBelow(reynolds, min) || isBelow(max, reynolds)) {
    notes.push(makeNote("reynolds-outside-line-range", { line: asked, reynolds, min, max }));
  }
  const used = answer.frictionLineUsed;
  const ratioRange = used === "blasius" ? undefined : friction.lines[used].lengthOverRoughnessRange;
  const lengthOverRoughness = lengthOverRoughnessOf(friction);
  if (ratioRange && lengthOverRoughness !== undefined && !within(lengthOverRoughness, ratioRange)) {
    const values: NoteValues = { line: used, lengthOverRoughness, min: ratioRange.min };
    if (Number.isFinite(ratioRange.max)) values.max = ratioRange.max;
    notes.push(makeNote("roughness-ratio-outside-range", values));
  }
}

/** x/k_s at the end; nothing on a surface without roughness, or with so little that the ratio has no number. */
function lengthOverRoughnessOf({ runUp, length, roughness }: FrictionCase): number | undefined {
  const ratio = (runUp + length) / roughness;
  return Number.isFinite(ratio) ? ratio : undefined;
}

function addLaminarNotes({ friction, setup }: FrictionFacts, notes: Note[]): void {
  const { transition, endReynolds } = setup;
  if (transition.kind === "from-start") return;
  const laminarReynolds = transition.kind === "at" ? Math.min(transition.reynolds, endReynolds) : endReynolds;
  if (isBelow(BLASIUS_RANGE.max, laminarReynolds)) {
    notes.push(makeNote("laminar-above-critical", { laminarReynolds, criticalReynolds: BLASIUS_RANGE.max }));
  }
  if (transition.kind === "never" && friction.runUp > 0) {
    notes.push(makeNote("laminar-behind-body", { runUp: friction.runUp }));
  }
}

function addRoughnessNotes(facts: FrictionFacts, notes: Note[]): void {
  const { friction, setup, answer } = facts;
  const { roughness, frictionLine: line } = friction;
  const heights = { roughness, admissibleRoughness: setup.admissibleRoughness };
  if (!setup.isSmoothEnough && isHeldLaminar(facts)) notes.push(makeNote("laminar-on-rough-surface", heights));
  if (line === "automatic") {
    if (setup.transition.kind === "from-start" && setup.askedTransition.kind === "at") {
      notes.push(makeNote("roughness-turbulent-from-start", heights));
    }
    return;
  }
  const { surface } = friction.lines[line];
  if (surface === "smooth" && !setup.isSmoothEnough && !isHeldLaminar(facts)) {
    notes.push(makeNote("roughness-above-admissible", { line, ...heights }));
  }
  if (surface === "rough" && answer.roughnessVerdict !== "rough" && !isHeldLaminar(facts)) {
    const { roughnessReynolds } = answer;
    const verdict = answer.roughnessVerdict ?? "smooth";
    notes.push(makeNote("fully-rough-line-on-smoother-surface", { line, verdict, roughnessReynolds }));
  }
}

function addNamedLineNotes({ friction, setup, answer }: FrictionFacts, notes: Note[]): void {
  const line = friction.frictionLine;
  if (line === "automatic" || answer.frictionLineUsed !== "blasius" || isLaminarAtEnd(setup)) return;
  const crossing = friction.lines[line].turbulentLayer(setup.roughnessReynolds).blasiusBelow;
  notes.push(makeNote("blasius-below-crossing", { line, reynolds: setup.endReynolds, crossing }));
}

function addAutomaticNotes(facts: FrictionFacts, notes: Note[]): void {
  const { friction, setup, answer } = facts;
  const { frictionLineUsed: line, roughnessReynolds } = answer;
  const lengthOverRoughness = lengthOverRoughnessOf(friction);
  const values: NoteValues = { line, reason: automaticReason(facts), reynolds: setup.endReynolds, roughnessReynolds };
  if (lengthOverRoughness !== undefined) values.lengthOverRoughness = lengthOverRoughness;
  notes.push(makeNote("automatic-choice", values));
  if (line === "fully-rough" && setup.isSmoothEnough) {
    notes.push(makeNote("rough-line-governs-smooth-surface", { ratio: setup.roughnessReynolds }));
  }
  if (line === "blasius" && !isLaminarAtEnd(setup)) {
    const crossing = PRANDTL_SCHLICHTING.turbulentLayer(0).blasiusBelow;
    notes.push(
      makeNote("blasius-below-crossing", { line: PRANDTL_SCHLICHTING.name, reynolds: setup.endReynolds, crossing }),
    );
  }
  if (answer.roughnessVerdict === "between" && !isLaminarAtEnd(setup)) notes.push(betweenNote(facts));
}

function automaticReason({ setup, answer }: FrictionFacts): string {
  if (isLaminarAtEnd(setup)) return "laminar";
  if (answer.frictionLineUsed === "blasius") return "below-crossing";
  return answer.frictionLineUsed === "fully-rough" ? "rough" : "smooth";
}

/** Between the regimes neither line is meant: the momentum integral, which knows them all, stands beside. */
function betweenNote({ friction, setup, answer, newtonsPerMetre }: FrictionFacts): Note {
  const layer = frictionLayer(friction.lines["momentum-integral"], setup.roughnessReynolds, setup.transition);
  const momentumIntegralDrag =
    newtonsPerMetre * setup.viscousLength * frictionBetween(layer, setup.startReynolds, setup.spanReynolds);
  return makeNote("regime-between", {
    roughnessReynolds: answer.roughnessReynolds,
    drag: answer.drag,
    momentumIntegralDrag,
    difference: momentumIntegralDrag / answer.drag - 1,
  });
}
