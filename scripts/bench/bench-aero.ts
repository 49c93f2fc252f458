import { frictionItemTimes } from "./friction-items";
import { uncertaintyTimes } from "./budget-uncertainty";
import { momentumIntegralTimes } from "./momentum-integral";
import { monteCarloTimes } from "./monte-carlo";
import { spreadsheetTimes } from "./spreadsheet-budget";

/** Ratios of times in one run: machines differ, ratios hardly. A goal that is missed ends the run with status 1. */
const { bare, drawn } = monteCarloTimes();
report("Monte Carlo of 10⁴ draws on 200 items over the bare loop", drawn / bare, "≤", 2);
print(`  ${(drawn / 1000).toFixed(2)} s of processor`);

for (const [line, { items, bare }] of Object.entries(frictionItemTimes())) {
  report(`10,000 plates by ${line}, notes included, over a bare loop of the same formulas`, items / bare, "≤", 4);
}
const { closedForm, smooth, rough } = momentumIntegralTimes();
report("momentum integral, smooth, over a closed-form line", smooth / closedForm, "≤", 40);
report("momentum integral, rough, over a closed-form line", rough / closedForm, "≤", 40);

const { budget, spreadsheet, difference, cells } = spreadsheetTimes();
if (!(Math.abs(difference) < 1e-6)) throw new Error(`the spreadsheet differs by ${difference}`);
report(
  `spreadsheet engine (${cells} formulas) over a budget of 1,000 plates, new speed`,
  spreadsheet / budget,
  "≥",
  25,
);
print(`  the budget: ${budget.toFixed(1)} ms, the spreadsheet: ${spreadsheet.toFixed(0)} ms`);

const { evaluated, uncertainty } = uncertaintyTimes();
report("first-order uncertainty of 500 uncertain plates over evaluating them once", uncertainty / evaluated, "≤", 25);
print(`  ${uncertainty.toFixed(0)} ms inside the transaction of a last signature`);

function report(what: string, ratio: number, sign: "≤" | "≥", goal: number): void {
  const isMet = sign === "≤" ? ratio <= goal : ratio >= goal;
  if (!isMet) process.exitCode = 1;
  print(`${isMet ? "met   " : "MISSED"} ${ratio.toFixed(2).padStart(7)} × (${sign} ${goal} ×)  ${what}`);
}

function print(line: string): void {
  process.stdout.write(`${line}\n`);
}
