import { useId } from "react";

import { percent } from "./scale";
import { Hatches } from "./stave";

interface ShareBarProps {
  /** Part of the whole bar. */
  share: number;
  /** Drawn hatched: what is a judgement and not a source's. */
  hatched: boolean;
}

/** The small bar of a row whose column says the same in figures. */
export function ShareBar({ share, hatched }: ShareBarProps) {
  const id = useId();

  return (
    <svg width="100%" height="18" className="block min-w-24" aria-hidden data-share={share}>
      <Hatches id={id} />
      <rect y="3" width="100%" height="12" className="fill-trough" />
      <rect
        y="3"
        width={percent(share)}
        height="12"
        fill={hatched ? `url(#${id}-growth)` : undefined}
        className={hatched ? "stroke-water" : "fill-water"}
      />
    </svg>
  );
}
