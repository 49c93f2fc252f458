import { useId } from "react";

import { type AllocationBarInput, allocationBarLayout } from "./allocation-bar-layout";
import { percent } from "./scale";
import { Hatches } from "./stave";
import type { Span } from "./stave-layout";

/** The small bar of a row against its allocation's post. The row's columns say the same in figures. */
export function AllocationBar(input: AllocationBarInput) {
  const id = useId();
  const { basic, growth, over, post } = allocationBarLayout(input);

  return (
    <svg width="92" height="18" className="inline-block align-middle" aria-hidden>
      <Hatches id={id} />
      <rect y="3" width="100%" height="12" className="fill-trough" />
      <Bar span={basic} className="fill-water" />
      <Bar span={growth} fill={`url(#${id}-growth)`} />
      {over ? <Bar span={over} fill={`url(#${id}-over)`} className="stroke-signal" /> : null}
      {post === null ? null : (
        <line x1={percent(post)} x2={percent(post)} y1="0" y2="18" strokeWidth="2" className="stroke-ink" />
      )}
    </svg>
  );
}

function Bar({ span, ...paint }: { span: Span; className?: string; fill?: string }) {
  return <rect x={percent(span.from)} y="3" width={percent(Math.max(0, span.to - span.from))} height="12" {...paint} />;
}
