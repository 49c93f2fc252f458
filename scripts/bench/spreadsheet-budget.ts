import { HyperFormula } from "hyperformula";
import { evaluateBudget } from "@/lib/evaluation/budget/evaluate-budget";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { budgetState } from "@/tests/support/budget-state";
import { bestTimes } from "./processor-time";

const ITEMS = 1000;
const ROUNDS = 15;
const ROUGHNESS = 1e-5;
const GROWTH = 0.2;
/** Columns of a row before its first formula, and the rows above the first item. */
const FIRST_ROW = 6;

/** Milliseconds of a budget of 1,000 plates after one change of speed: here, and in a spreadsheet that gives the same. */
export function spreadsheetTimes() {
  const state = plateBudget();
  const sheet = HyperFormula.buildFromArray(sheetCells(), { licenseKey: "gpl-v3" });
  let [speed, sheetSpeed] = [25, 25];
  const times = bestTimes(
    {
      budget: () => predictedAt(state, (speed += 0.01)),
      spreadsheet: () => predictedInSheet(sheet, (sheetSpeed += 0.01)),
    },
    ROUNDS,
  );
  return { ...times, difference: predictedInSheet(sheet, 31) / predictedAt(state, 31) - 1, cells: formulaCount() };
}

function lengthOf(index: number): number {
  return 1 + index / 100;
}

function plateBudget(): BudgetState {
  const plate = (index: number) => ({
    ...{ name: `Plate ${index}`, order: index, ownerId: 1, grade: "estimated", methodVersion: 1 },
    ...{ method: "flat-plate-friction", length: { value: lengthOf(index) }, breadth: { value: 0.5 }, faces: 2 },
    ...{ roughness: { value: ROUGHNESS }, frictionLine: "prandtl-schlichting" },
  });
  return budgetState({
    code: "BN-2",
    name: "Bench",
    kind: "other_body",
    point: { fluid: "custom", density: { value: 1.2 }, dynamicViscosity: { value: 1.8e-5 }, speed: { value: 25 } },
    limitHundredths: 1_000_000_000,
    reserveHundredths: 0,
    items: Object.fromEntries(
      Array.from({ length: ITEMS }, (_, index) => [String(index).padStart(4, "0"), plate(index)]),
    ),
  });
}

function predictedAt(state: BudgetState, speed: number): number {
  const lines = state.lines.map((line) =>
    line.kind === "operating_point" ? { ...line, body: { ...line.body, speed: { value: speed } } } : line,
  );
  return evaluateBudget({ ...state, lines }).points[0]?.totals.predicted ?? NaN;
}

function predictedInSheet(sheet: HyperFormula, speed: number): number {
  sheet.setCellContents({ sheet: 0, row: 0, col: 1 }, speed);
  const total = sheet.getCellValue({ sheet: 0, row: FIRST_ROW - 1 + ITEMS, col: 1 });
  return typeof total === "number" ? total : NaN;
}

const KAPPA = 0.41;
const WAKE = 0.55;
const A = (1 + WAKE) / KAPPA;
const C = (2 + 2 * WAKE * (1 + 0.5894898722360836) + 1.5 * WAKE ** 2) / KAPPA ** 2;
const K = Math.exp(-KAPPA * 5 - 2 * WAKE);
const ROUGH = Math.exp(-KAPPA * 3.5);

function sheetCells(): (string | number)[][] {
  const stream = [
    ["speed", 25],
    ["density", 1.2],
    ["viscosity", 1.8e-5],
    ["kinematic", "=B3/B2"],
    ["pressure", "=0.5*B2*B1^2"],
  ];
  const rows = Array.from({ length: ITEMS }, (_, index) => rowOf(index, FIRST_ROW + index));
  const last = FIRST_ROW + ITEMS - 1;
  return [...stream, ...rows, ["totals", `=SUM(${PREDICTED}${FIRST_ROW}:${PREDICTED}${last})`]];
}

/** Names of the columns from E on, in the order of their formulas. */
const FORMULAS: readonly ((row: number) => string)[] = [
  (r) => `=B$1*A${r}/B$4`, // E: Re
  (r) => `=B$1*D${r}/B$4`, // F: Re_k
  (r) => `=IF(E${r}<=500000,1.328*SQRT(E${r}),E${r}*0.455/LOG10(E${r})^2.58-1613.8237)`, // G: F U/ν
  (r) => `=IF(E${r}<=500000,0.664/SQRT(E${r}),0.455/LOG10(E${r})^2.58*(1-2.58/LN(E${r})))`, // H: local
  (r) => `=G${r}/E${r}`, // I: mean
  (r) => `=G${r}/2*B$4/B$1`, // J: θ
  (r) => `=B$5*H${r}`, // K: τ_w
  () => `=100*B$4/B$1`, // L: admissible
  (r) => `=F${r}*SQRT(H${r}/2)`, // M: k_s⁺
  (r) => `=IF(F${r}<=100,"smooth",IF(M${r}>=70,"rough","between"))`, // N
  (r) => `=IF(E${r}>500000,500000*B$4/B$1,"")`, // O: transition
  (r) => `=IF(E${r}>500000,"prandtl-schlichting","blasius")`, // P
  (r) => `=${ROUGH}*MIN(F${r},E${r}/100)`, // Q: r
  (r) => `=MAX(${C / A}+1,LN(G${r}/2/${0.49 * K})/${KAPPA})`, // R: λ to start from
  ...newtonStep("R"), // S, T, U
  ...newtonStep("U"), // V, W, X
  ...newtonStep("X"), // Y, Z, AA
  ...newtonStep("AA"), // AB, AC, AD
  (r) => `=J${r}*AD${r}^2/(${A}*(AD${r}-${C / A}))`, // AE: δ
  (r) => `=J${r}*AD${r}/(AD${r}-${C / A})`, // AF: δ*
  (r) => `=IF(OR(E${r}<500000,E${r}>1000000000),"outside its range","")`, // AG
  (r) => `=IF(F${r}>100,"rougher than admissible","")`, // AH
  (r) => `=B$5*C${r}*B${r}*G${r}*B$4/B$1`, // AI: drag
  (r) => `=${GROWTH}*ABS(AI${r})`, // AJ: growth
  (r) => `=AI${r}+AJ${r}`, // AK: predicted
];
const PREDICTED = "AK";

function rowOf(index: number, row: number): (string | number)[] {
  return [lengthOf(index), 0.5, 2, ROUGHNESS, ...FORMULAS.map((formula) => formula(row))];
}

/** Re_θ at a λ, its slope, and the next λ of Newton's method in ln(λ − C/A); three columns after that of λ. */
function newtonStep(lambda: string): ((row: number) => string)[] {
  const reached = next(lambda);
  const slope = next(reached);
  const grown = (r: number) => `${K}*EXP(${KAPPA}*${lambda}${r})`;
  const rough = (r: number) => `Q${r}/${lambda}${r}`;
  const open = (r: number) => `(${A}-${C}/${lambda}${r})`;
  const u = (r: number) => `(${lambda}${r}-${C / A})`;
  return [
    (r) => `=${grown(r)}*(1+${rough(r)})*${open(r)}`,
    (r) =>
      `=${grown(r)}*(${open(r)}*(${KAPPA}+${rough(r)}*(${KAPPA}-1/${lambda}${r}))+(1+${rough(r)})*${C}/${lambda}${r}^2)`,
    (r) => `=${C / A}+${u(r)}*EXP(-LN(${reached}${r}/(G${r}/2))*${reached}${r}/(${u(r)}*${slope}${r}))`,
  ];
}

/** The column after: R, S … Z, AA, AB. */
function next(column: string): string {
  if (column === "Z") return "AA";
  return column.slice(0, -1) + String.fromCharCode(column.charCodeAt(column.length - 1) + 1);
}

function formulaCount(): number {
  return FORMULAS.length * ITEMS;
}
