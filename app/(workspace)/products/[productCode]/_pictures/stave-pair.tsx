import type { Scale } from "./scale";
import { Posts, StaveBar } from "./stave";
import { scaledStave, type StaveInput, staveLayout } from "./stave-layout";

export interface NamedStave {
  /** "issue 14", "with 31". */
  label: string;
  /** Newtons. */
  input: StaveInput;
  /** What a newton is in the measure to whose scale it is drawn; one measure for all of them. */
  perNewton?: number;
  /** Printed at the right: "294.00 N predicted". */
  text: string;
}

/** Staves above one another to one scale: what stands and what would. */
export function StavePair({ staves }: { staves: readonly NamedStave[] }) {
  const drawn = staves.map(({ label, input, text, perNewton = 1 }) => ({
    ...{ label, text, layout: staveLayout(scaledStave(input, perNewton)) },
  }));
  const scale = commonScale(drawn.map(({ layout }) => layout.scale));

  return (
    <div className="space-y-1.5" aria-hidden>
      {drawn.map(({ label, text, layout }) => (
        <div
          key={label}
          className="grid grid-cols-[4.5rem_minmax(0,1fr)] items-center gap-x-3 sm:grid-cols-[5.5rem_minmax(0,1fr)_9rem]"
        >
          <span className="text-sm">{label}</span>
          <svg
            width="100%"
            height="26"
            className="block overflow-visible"
            data-stave
            data-scale-min={scale.min}
            data-scale-max={scale.max}
          >
            <rect y="5" width="100%" height="16" className="fill-trough" />
            <StaveBar layout={layout} scale={scale} top={5} height={16} />
            <Posts layout={layout} scale={scale} top={0} foot={26} />
          </svg>
          <span className="col-start-2 text-right text-sm sm:col-start-3">{text}</span>
        </div>
      ))}
    </div>
  );
}

function commonScale(scales: readonly Scale[]): Scale {
  return { min: Math.min(...scales.map(({ min }) => min)), max: Math.max(...scales.map(({ max }) => max)) };
}
