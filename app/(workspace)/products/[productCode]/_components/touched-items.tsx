import type { EffectReadings } from "@/app/(workspace)/_measures/effect-readings";
import type { TouchView } from "@/lib/proposals/views";

import { ItemEffects } from "./item-effects";

interface TouchedItemsProps {
  touches: readonly TouchView[];
  readings: EffectReadings;
}

/** What a changed finish or another version of a method does to every item that it reaches, those that stay among them. */
export function TouchedItems({ touches, readings }: TouchedItemsProps) {
  return touches.map(({ title, sentence, effects }) => (
    <ItemEffects
      key={title}
      heading={`Touched by ${title}`}
      lead={`It ${sentence}`}
      effects={effects}
      readings={readings}
    />
  ));
}
