import { trueMinus } from "@/lib/units/format-number";

/** A growth with its sign, one decimal: "+4.2 %". */
export function growthText(fraction: number): string {
  const percent = (fraction * 100).toFixed(1);
  return `${fraction > 0 ? "+" : ""}${trueMinus(percent)} %`;
}

/** An allowance as it stands in the table: "15 %". */
export function allowanceText(fraction: number): string {
  return `${Number((fraction * 100).toFixed(6))} %`;
}
