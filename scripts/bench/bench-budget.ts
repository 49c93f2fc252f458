import { signInOverHttp } from "@/tests/e2e/support/http-person";
import { GROUPS, ITEMS, POINTS } from "@/tests/support/large-budget";
import { sheetTimes } from "./sheet-over-http";
import { wholeBudgetTimes } from "./whole-budget";

/** Ratios of times in one run: machines differ, ratios hardly. A goal that is missed ends the run with status 1. */
void bench().catch((error: unknown) => {
  process.stderr.write(`${String(error)}\n`);
  process.exitCode = 1;
});

async function bench(): Promise<void> {
  print(`${ITEMS} items × ${POINTS.length} operating points × ${GROUPS} groups`);
  await reportSheets(process.argv[2] ?? "");
  const { whole, bare } = wholeBudgetTimes();
  report(`evaluating the whole budget (${milliseconds(whole)}) over a bare loop of the formulas`, whole / bare, 4);
}

/** The sheet's data over HTTP, on the application that runs at `address`. */
async function reportSheets(address: string): Promise<void> {
  const times = await sheetTimes(await signInOverHttp(address, "tansy"));
  const { empty } = times;
  print(`an empty authenticated route: ${milliseconds(empty)}`);
  report(`the sheet's data, first read (${milliseconds(times.first)})`, times.first / empty, 8);
  report(`the sheet's data, sent again (${milliseconds(times.later)})`, times.later / empty, 1.5);
  report(`the sheet's data, known to the reader (${milliseconds(times.known)})`, times.known / empty, 1.5);
  report(`five operating points stored over one (${milliseconds(times.one)})`, times.later / times.one, 1.3);
  print(`${times.bytes} bytes over the wire`);
}

function report(what: string, ratio: number, goal: number): void {
  const isMet = ratio <= goal;
  if (!isMet) process.exitCode = 1;
  print(`${isMet ? "met   " : "MISSED"} ${ratio.toFixed(2).padStart(6)} × (≤ ${goal} ×)  ${what}`);
}

function milliseconds(time: number): string {
  return `${time.toFixed(2)} ms`;
}

function print(line: string): void {
  process.stdout.write(`${line}\n`);
}
