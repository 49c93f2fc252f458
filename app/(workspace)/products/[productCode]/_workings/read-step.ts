import type { MeasureBasis } from "@/lib/evaluation/measures/measure-basis";
import { isKept, type Reading, readNumber } from "@/lib/evaluation/measures/reading";
import { formatExact, formatSignificant } from "@/lib/units/format-number";
import { usPerSi } from "@/lib/units/us-customary";
import { MEASURE_NAMES } from "@/lib/vocabulary/measures";

import type { WorkingStep } from "./working";

/** How the newtons at the end of a working are read in the chosen measure; null where they are read as they are kept. */
export function readStep(reading: Reading, basis: MeasureBasis, newtons: number): WorkingStep | null {
  if (isKept(reading)) return null;
  const name = MEASURE_NAMES[reading.measure];
  const { symbol, formula, factors } = derivationOf(reading, basis);
  return {
    quantity: `Read as ${name.charAt(0).toLowerCase()}${name.slice(1)}`,
    symbol,
    formula,
    withValues: [formatSignificant(newtons, 4), ...factors].join(" "),
    value: readNumber(reading, newtons),
    unit: reading.unit,
    source: reading.basis,
    range: null,
  };
}

interface Derivation {
  symbol: string;
  formula: string;
  /** After the newtons, each with its sign. */
  factors: string[];
}

/** In SI; where the reader's units are others, the value is converted besides. */
function derivationOf({ measure }: Reading, basis: MeasureBasis): Derivation {
  const q = formatSignificant(basis.dynamicPressure, 4);
  const area = formatExact(basis.referenceArea ?? 0);
  const speed = formatSignificant(basis.speed, 4);
  switch (measure) {
    case "newtons":
      return { symbol: "F", formula: "F = D/(1 lbf)", factors: [`/ ${formatSignificant(1 / usPerSi("force"), 7)}`] };
    case "drag-area":
      return { symbol: "C_D A", formula: "C_D A = D/q", factors: [`/ ${q}`] };
    case "coefficient":
      return { symbol: "C_D", formula: "C_D = D/(q · A)", factors: [`/ (${q} · ${area})`] };
    case "counts":
      return {
        ...{ symbol: "n", formula: "n = D/(q · A · c)" },
        factors: [`/ (${q} · ${area} · ${formatExact(basis.countSize)})`],
      };
    case "power":
      return { symbol: "P", formula: "P = D · U", factors: [`· ${speed}`] };
    case "energy":
      return {
        ...{ symbol: "E", formula: "E = D · U · h/1000" },
        factors: [`· ${speed} · ${formatExact(basis.hoursPerYear ?? 0)}/1000`],
      };
    case "pascals":
      return { symbol: "Δp", formula: "Δp = D/A", factors: [`/ ${formatExact(basis.flowArea ?? 0)}`] };
  }
}
