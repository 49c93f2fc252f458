import { toHundredths } from "@/lib/units/rounding";
import type { TermsBody } from "../lines/terms-body";

export type PlannedProfile = TermsBody["plannedProfile"];

/** What was planned for a moment, in hundredths of a newton; between two dates of the profile not always whole. */
export interface PlannedValue {
  predicted: number;
  tolerance: number;
}

export type BandSide = "inside" | "above" | "below";

/**
 * The planned total at a moment: on a straight line between two dates of the profile (midnight UTC), and from the last
 * one on what it says; null before the first.
 */
export function plannedAt(profile: PlannedProfile, at: string): PlannedValue | null {
  const moment = Date.parse(at);
  const rows = profile
    .map((row) => ({
      time: Date.parse(row.date),
      predicted: row.predictedHundredths,
      tolerance: row.toleranceHundredths,
    }))
    .sort((one, other) => one.time - other.time);
  const before = rows.findLast(({ time }) => time <= moment);
  const after = rows.find(({ time }) => time > moment);
  if (!before) return null;
  if (!after) return { predicted: before.predicted, tolerance: before.tolerance };
  const part = (moment - before.time) / (after.time - before.time);
  const between = (from: number, to: number) => from + (to - from) * part;
  return {
    predicted: between(before.predicted, after.predicted),
    tolerance: between(before.tolerance, after.tolerance),
  };
}

/** Where a predicted total lies to the tolerance band, decided on 0.01 N; null where nothing was planned yet. */
export function bandSide(profile: PlannedProfile, at: string, predicted: number): BandSide | null {
  const planned = plannedAt(profile, at);
  if (planned === null) return null;
  const off = toHundredths(predicted) - planned.predicted;
  // The edge belongs to the band, whatever the interpolation rounds it to.
  if (Math.abs(off) <= planned.tolerance + 1e-6) return "inside";
  return off > 0 ? "above" : "below";
}
