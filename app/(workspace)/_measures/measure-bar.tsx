import { Notice } from "@/app/_components/notice";
import { isKept, type Reading } from "@/lib/evaluation/measures/reading";
import { MEASURE_NAMES, type Measure } from "@/lib/vocabulary/measures";

import type { ChosenMeasure } from "./chosen-measure";
import { MeasureSwitch } from "./measure-switch";

interface MeasureBarProps {
  chosen: ChosenMeasure;
  /** Of the operating point shown; its basis is always printed with it. */
  reading: Reading;
  hrefOf: (measure: Measure) => string;
}

/** The one switch of measures, and what the chosen one is referred to. */
export function MeasureBar({ chosen, reading, hrefOf }: MeasureBarProps) {
  const { measure, offered, units, refusal } = chosen;

  return (
    <div className="mb-3">
      {refusal ? (
        <div className="mb-2">
          <Notice>{refusal}</Notice>
        </div>
      ) : null}
      <MeasureSwitch
        chosen={measure}
        choices={offered.map((each) => ({
          measure: each,
          label: MEASURE_NAMES[each],
          unit: UNITS[units][each],
          href: hrefOf(each),
        }))}
      />
      {isKept(reading) ? null : (
        <p className="text-sm text-ink-2" data-measure-basis>
          {reading.basis ? `${reading.basis} · ` : ""}newtons are kept, and decide
        </p>
      )}
    </div>
  );
}

const SI = {
  newtons: "N",
  "drag-area": "m²",
  coefficient: "",
  counts: "",
  power: "W",
  energy: "kWh",
  pascals: "Pa",
} as const satisfies Record<Measure, string>;

const UNITS: Record<ChosenMeasure["units"], Record<Measure, string>> = {
  si: SI,
  us: { ...SI, newtons: "lbf", "drag-area": "ft²", power: "hp", pascals: "lbf/ft²" },
};
