import { figure, percent } from "./figure";
import { lineTitle } from "./line-title";
import type { NoteCode } from "./note-code";
import { information, type NoteMeaning } from "./note-meaning";
import type { NoteValues } from "./note";

export const INFORMATION = {
  "automatic-choice": information(automaticChoice),
  "blasius-below-crossing": information(
    ({ line, reynolds, crossing }) =>
      `The layer ends at Re ${figure(reynolds)}, below Re ${figure(crossing)} where ${lineTitle(line)} crosses Blasius, ` +
      `so that friction is Blasius's here; nothing is to be done unless the layer is known to be turbulent so early.`,
  ),
  "thickness-by-wall-and-wake": information(
    ({ line }) =>
      `${capital(lineTitle(line))} has no profile of its own: δ and δ* are those of the wall-and-wake profile at the same ` +
      `Re_θ. Take them as estimates.`,
  ),
  "regime-between": information(
    ({ roughnessReynolds, drag, momentumIntegralDrag, difference }) =>
      `The surface is neither smooth nor fully rough (k_s⁺ ${figure(roughnessReynolds)}); the greater of the two lines gives ` +
      `${figure(drag)} N, the momentum integral ${figure(momentumIntegralDrag)} N (${percent(difference)} of difference). ` +
      `Name the momentum-integral line if that regime decides.`,
  ),
  "rough-line-governs-smooth-surface": information(
    ({ ratio }) =>
      `U k_s/ν is ${figure(ratio)}, so that the surface counts as smooth (100 or less), yet the fully rough line gives the ` +
      `greater friction and governs. A finer finish would lower the drag.`,
  ),
  "roughness-turbulent-from-start": information(
    ({ roughness, admissibleRoughness }) =>
      `Roughness ${figure(roughness)} m is above the admissible ${figure(admissibleRoughness)} m, so that the layer is taken ` +
      `turbulent from its start and the transition asked for has no effect. Choose "laminar" only with evidence.`,
  ),
  "duct-friction-reads-low": information(
    ({ coreSpeedRatio, dynamicPressureExcess }) =>
      `Friction is taken at the entry speed; at the exit the core runs ${figure(coreSpeedRatio)} times as fast and its ` +
      `dynamic pressure is ${percent(dynamicPressureExcess)} higher, so that wall friction reads low there by about as much. ` +
      `Diverge the walls to keep the core speed, or add a local speed ratio by plates.`,
  ),
  "fully-developed-cross-check": information(
    ({ lengthOverDiameter, developedDrag, drag }) =>
      `The duct is ${figure(lengthOverDiameter)} hydraulic diameters long: fully developed flow (Colebrook) would give ` +
      `${figure(developedDrag)} N against ${figure(drag)} N by plates from the entry. Use it as a check of the order.`,
  ),
} satisfies Partial<Record<NoteCode, NoteMeaning>>;

function automaticChoice({ line, reason, roughnessReynolds, reynolds, lengthOverRoughness }: NoteValues): string {
  const chosen = capital(lineTitle(line));
  switch (reason) {
    case "laminar":
      return `The automatic choice took Blasius: the layer is laminar to its end at Re ${figure(reynolds)}.`;
    case "below-crossing":
      return `The automatic choice took Blasius: at Re ${figure(reynolds)} it lies above the turbulent lines.`;
    case "rough":
      return (
        `The automatic choice took ${chosen}: at x/k_s ${figure(lengthOverRoughness)} and k_s⁺ ` +
        `${figure(roughnessReynolds)} it gives more friction than the smooth line.`
      );
    default:
      return lengthOverRoughness === undefined
        ? `The automatic choice took ${chosen}: the surface is given without roughness, at Re ${figure(reynolds)}.`
        : `The automatic choice took ${chosen}: at Re ${figure(reynolds)} and x/k_s ${figure(lengthOverRoughness)} it gives ` +
            `more friction than the fully rough line.`;
  }
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
