import { z } from "zod";
import { BluffBodyBody } from "./items/bluff-body";
import { DragAreaBody } from "./items/drag-area";
import { DuctEntryBody } from "./items/duct-entry";
import { FixedBody } from "./items/fixed";
import { FlatPlateBody } from "./items/flat-plate-friction";
import { LossCoefficientBody } from "./items/loss-coefficient";
import { MeasuredBody } from "./items/measured";
import { ShareBody } from "./items/share";

/** An item's revision: a flat record, discriminated by its method. */
export const ItemBody = z.discriminatedUnion(
  "method",
  [FlatPlateBody, DuctEntryBody, LossCoefficientBody, BluffBodyBody, DragAreaBody, MeasuredBody, FixedBody, ShareBody],
  "Choose a method.",
);
export type ItemBody = z.output<typeof ItemBody>;
export type MethodName = ItemBody["method"];
