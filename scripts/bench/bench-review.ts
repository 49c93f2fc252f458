import type { LineEdit } from "@/lib/evaluation/budget/edits";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import { previewChange } from "@/lib/evaluation/budget/preview-change";
import { itemNumber, ITEMS, largeBudget } from "@/tests/support/large-budget";
import { bestTimes, type Subject } from "./processor-time";

/** What a reviewer waits for: the preview of one edit beside computing the whole budget, by turns in one run. */
const ROUNDS = 25;
const CALLS = 10;
const GOAL = 0.1;

const state = largeBudget();
const frozen = evaluateBudget(state);
const EDITS = {
  "a plate": revise(itemNumber(21), { breadth: { value: 0.6 } }),
  "a plate that another lies behind": revise(itemNumber(20), { length: { value: 2 } }),
  "a body that its group's share counts": revise(itemNumber(8), { dragCoefficient: 0.5 }),
  "a fixed force": revise(itemNumber(19), { force: { value: 2 } }),
  "a share's fraction": revise(itemNumber(49), { fraction: 0.06 }),
};

// A state that nobody has gone through yet, as each edit makes one.
const subjects: Record<string, Subject> = {
  whole: () => repeat(() => evaluateBudget({ ...state, lines: [...state.lines] }).points.length),
};
for (const [name, edit] of Object.entries(EDITS)) {
  subjects[name] = () => repeat(() => previewChange(state, frozen, [edit], []).effects.items.length);
}
const { whole = NaN, ...previews } = bestTimes(subjects, ROUNDS);
print(`${ITEMS} items at ${frozen.points.length} operating points, computed whole: ${(whole / CALLS).toFixed(2)} ms`);
const ratios = Object.entries(previews).map(([name, time]) => {
  print(`${(time / whole).toFixed(3)} of the whole, ${(time / CALLS).toFixed(2)} ms: the preview of ${name}`);
  return time / whole;
});
const median = ratios.toSorted((one, other) => one - other)[Math.floor(ratios.length / 2)] ?? Infinity;
if (median > GOAL) process.exitCode = 1;
print(
  `${median > GOAL ? "MISSED" : "met   "} ${median.toFixed(3)} × (≤ ${GOAL} ×)  the median of these previews of one edit`,
);

function revise(number: string, change: object): LineEdit {
  const line = state.lines.find((each) => each.kind === "item" && each.number === number);
  if (!line) throw new Error(`there is no item ${number}`);
  return { operation: "revise", kind: "item", number, baseLetter: line.letter, body: { ...line.body, ...change } };
}

function repeat(subject: () => number): number {
  let sum = 0;
  for (let call = 0; call < CALLS; call += 1) sum += subject();
  if (sum === 0) throw new Error("the subject did nothing");
  return sum;
}

function print(line: string): void {
  process.stdout.write(`${line}\n`);
}
