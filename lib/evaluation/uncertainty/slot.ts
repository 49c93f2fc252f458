import type { UncertainNumber } from "../document/number-input";

/** A number inside an input that follows causes: its nominal value and what they deviate by. */
export interface Slot {
  target: UncertainNumber;
  nominal: number;
  /** Places of its causes; several where lengths add up to a run-up. */
  causes: readonly number[];
}

/** Writes the values that the deviations of the causes give into the inputs. */
export function fillSlots(slots: readonly Slot[], deviations: Float64Array): void {
  for (const slot of slots) {
    let value = slot.nominal;
    for (const place of slot.causes) value += deviations[place] ?? 0;
    slot.target.value = value;
  }
}
