import type { FieldSpec } from "./field-spec";
import type { MethodName } from "./item-body";
import { BLUFF_BODY_FIELDS, newBluffBody } from "./items/bluff-body";
import { DRAG_AREA_FIELDS, newDragArea } from "./items/drag-area";
import { DUCT_ENTRY_FIELDS, newDuctEntry } from "./items/duct-entry";
import { FIXED_FIELDS, newFixed } from "./items/fixed";
import { FLAT_PLATE_FIELDS, newFlatPlate } from "./items/flat-plate-friction";
import type { NewItem } from "./items/item-common";
import { LOSS_COEFFICIENT_FIELDS, newLossCoefficient } from "./items/loss-coefficient";
import { MEASURED_FIELDS, newMeasured } from "./items/measured";
import { newShare, SHARE_FIELDS } from "./items/share";

export interface ItemMethod {
  label: string;
  /** What it is for, in one sentence. */
  summary: string;
  fields: readonly FieldSpec[];
  /** A draft body with defaults; null and "" stand where the author has to fill in. */
  template(item: NewItem): Record<string, unknown>;
}

/** Every method of an item: its fields and what a new one starts from. */
export const ITEM_METHODS: Record<MethodName, ItemMethod> = {
  "flat-plate-friction": {
    label: "Flat-plate friction",
    summary: "Skin friction of a flat or nearly flat surface along the stream.",
    fields: FLAT_PLATE_FIELDS,
    template: newFlatPlate,
  },
  "duct-entry": {
    label: "Duct entry",
    summary: "Friction of the four walls of a rectangular duct from its entry.",
    fields: DUCT_ENTRY_FIELDS,
    template: newDuctEntry,
  },
  "loss-coefficient": {
    label: "Loss coefficient",
    summary: "Pressure loss of a fitting or a device as a multiple of the dynamic pressure.",
    fields: LOSS_COEFFICIENT_FIELDS,
    template: newLossCoefficient,
  },
  "bluff-body": {
    label: "Bluff body",
    summary: "Drag coefficient on a reference area, with shelter where another body stands ahead.",
    fields: BLUFF_BODY_FIELDS,
    template: newBluffBody,
  },
  "drag-area": {
    label: "Drag area",
    summary: "A drag area from a source, scaled with the dynamic pressure.",
    fields: DRAG_AREA_FIELDS,
    template: newDragArea,
  },
  measured: {
    label: "Measured",
    summary: "A measured force, converted through drag area from the stream of the test.",
    fields: MEASURED_FIELDS,
    template: newMeasured,
  },
  fixed: {
    label: "Fixed",
    summary: "A force from a source, the same at every operating point.",
    fields: FIXED_FIELDS,
    template: newFixed,
  },
  share: {
    label: "Share",
    summary: "A fraction of other items or of a group: gaps, fasteners, interference.",
    fields: SHARE_FIELDS,
    template: newShare,
  },
};
