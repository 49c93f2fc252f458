import { CIPM_PRESSURES, CIPM_TEMPERATURES } from "@/lib/aero/fluids/humid-air-density";
import type { Range } from "@/lib/aero/range";
import { formatNewtons } from "@/lib/units/format-newtons";
import { figure } from "./figure";
import { lineTitle } from "./line-title";
import type { NoteValues } from "./note";
import type { NoteCode } from "./note-code";
import { caution, valueOf, type NoteMeaning } from "./note-meaning";

export const CAUTIONS = {
  "reynolds-outside-line-range": caution(
    ({ line, reynolds, min, max }) =>
      `Re ${figure(reynolds)} is outside the stated range of ${lineTitle(line)} (${figure(min)} to ${figure(max)}), where its ` +
      `scatter is unknown. Name a line that covers this Re, or say why it is used.`,
    (values) => factorOutside(values, "reynolds"),
  ),
  "roughness-ratio-outside-range": caution(
    ({ line, lengthOverRoughness, min, max }) =>
      `The ratio x/k_s ${figure(lengthOverRoughness)} is outside the stated range of ${lineTitle(line)} (${figure(min)} ` +
      `${max === undefined ? "or more" : `to ${figure(max)}`}). Check the roughness, or treat it as single obstacles.`,
    (values) => factorOutside(values, "lengthOverRoughness"),
  ),
  "laminar-above-critical": caution(
    ({ laminarReynolds, criticalReynolds }) =>
      `The layer is claimed laminar up to Re ${figure(laminarReynolds)}, above the usual critical Re ` +
      `${figure(criticalReynolds)}; few streams are quiet enough. Give evidence for the laminar run, or let it turn turbulent.`,
    (values) => valueOf(values, "laminarReynolds") / valueOf(values, "criticalReynolds"),
  ),
  "laminar-behind-body": caution(
    ({ runUp }) =>
      `The plate is held laminar ${figure(runUp)} m behind the start of its layer; joints and wakes upstream usually trip it. ` +
      `Give evidence, or let it turn turbulent.`,
    (values) => valueOf(values, "runUp"),
  ),
  "laminar-on-rough-surface": caution(
    ({ roughness, admissibleRoughness }) =>
      `The layer is held laminar over roughness ${figure(roughness)} m, above the admissible ${figure(admissibleRoughness)} m, ` +
      `which usually trips it. Give evidence, or choose a finer finish or a turbulent layer.`,
    (values) => valueOf(values, "roughness") / valueOf(values, "admissibleRoughness"),
  ),
  "roughness-above-admissible": caution(
    ({ line, roughness, admissibleRoughness }) =>
      `Roughness ${figure(roughness)} m is above the admissible ${figure(admissibleRoughness)} m while ${lineTitle(line)}, a ` +
      `line for smooth surfaces, is used: drag reads low. Choose a finer finish, or a line that knows roughness.`,
    (values) => valueOf(values, "roughness") / valueOf(values, "admissibleRoughness"),
  ),
  "fully-rough-line-on-smoother-surface": caution(
    ({ line, verdict, roughnessReynolds }) =>
      `${lineTitle(line)} stands for a fully rough surface, yet this one is ${verdict === "smooth" ? "smooth" : "between the regimes"} ` +
      `(k_s⁺ ${figure(roughnessReynolds)}, fully rough from 70). Name another line, or say why.`,
    (values) => 70 / Math.max(valueOf(values, "roughnessReynolds"), 1e-6),
  ),
  "layers-meet-in-duct": caution(
    ({ thickness, shorterSide }) =>
      `The layers of opposite walls meet before the exit: 2δ is ${figure(2 * number(thickness))} m on a side of ` +
      `${figure(shorterSide)} m, so that no core is left and plates from the entry no longer hold. Use a developed-flow loss.`,
    (values) => (2 * valueOf(values, "thickness")) / valueOf(values, "shorterSide"),
  ),
  "mach-above-limit": caution(
    ({ mach, limit }) =>
      `Mach ${figure(mach)} is above ${figure(limit)}: the methods are for incompressible flow. Correct for Mach outside, or ` +
      `lower the speed.`,
    (values) => valueOf(values, "mach") / valueOf(values, "limit"),
  ),
  "humid-air-outside-range": caution(
    ({ staticTemperature, staticPressure }) =>
      `The density of humid air (CIPM-2007) is stated for 15 to 27 °C and 600 to 1100 hPa; here it is used at ` +
      `${figure(inCelsius(staticTemperature))} °C and ${figure(number(staticPressure) / 100)} hPa. Leave the humidity empty ` +
      `for dry air, or say why it still holds.`,
    (values) =>
      Math.max(
        1 + distanceOutside(valueOf(values, "staticTemperature"), CIPM_TEMPERATURES),
        1 + distanceOutside(valueOf(values, "staticPressure"), CIPM_PRESSURES),
      ),
  ),
  "measured-reynolds-differs": caution(
    ({ ratio }) =>
      `Re here is ${figure(ratio)} times that of the test, more than twofold apart: the drag area may have changed. Measure ` +
      `nearer to this point, or say why it still holds.`,
    (values) => Math.max(valueOf(values, "ratio"), 1 / valueOf(values, "ratio")) / 2,
  ),
  "fresh-leading-edge-behind": caution(
    (values) =>
      `The plate lies behind item ${figure(values.behind)} and claims a fresh leading edge: friction reads high, blockage ` +
      `low.${onePlate(values)} Let the run-up follow that item, or say why the layer starts anew.`,
  ),
  "same-surface-twice": caution(
    (values) =>
      `Item ${figure(values.other)} stands on the same surface${values.surface === undefined ? "" : ` (${values.surface})`}: ` +
      `its drag may be counted twice.${onePlate(values)} Retire one of the two, let one lie behind the other, or say how ` +
      `the surface is shared.`,
  ),
} satisfies Partial<Record<NoteCode, NoteMeaning>>;

/** What the plate has by itself and as the rest of one plate, where the note carries both. */
function onePlate({ alone, onePlate: asOne }: NoteValues): string {
  if (typeof alone !== "number" || typeof asOne !== "number") return "";
  return ` By itself it has ${formatNewtons(alone)}, as the rest of one plate ${formatNewtons(asOne)}.`;
}

function factorOutside(values: NoteValues, name: string): number {
  const value = valueOf(values, name);
  const min = valueOf(values, "min");
  return value < min ? min / value : value / valueOf(values, "max");
}

/** How far beyond the nearer end, in widths of the range. */
function distanceOutside(value: number, { min, max }: Range): number {
  return Math.max(min - value, value - max, 0) / (max - min);
}

function inCelsius(kelvin: number | string | undefined): number {
  return number(kelvin) - 273.15;
}

function number(value: number | string | undefined): number {
  return typeof value === "number" ? value : NaN;
}
