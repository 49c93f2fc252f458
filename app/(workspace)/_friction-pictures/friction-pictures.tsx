import type { MethodInput } from "@/lib/evaluation/document/schema";
import type { StreamState } from "@/lib/evaluation/methods/stream-state";

import type { SpeedReading } from "./drag-over-speed";
import { DragOverSpeedFigure } from "./drag-over-speed-figure";
import { FrictionChartFigure } from "./friction-chart-figure";
import { frictionSubject } from "./friction-subject";
import { GrowthFigure, ShearFigure } from "./layer-figures";

interface FrictionPicturesProps {
  /** Of the method. */
  version: number;
  input: MethodInput;
  stream: StreamState;
  /** As it is called in summaries and tables: "Item 010". */
  name: string;
  /** Beside each other where there is room. */
  wide?: boolean;
  /** How forces over the speed are read; coefficients, thicknesses and shear are none. */
  read?: SpeedReading;
}

/** The pictures of an item, drawn by the functions that compute it; other methods than friction have drag over speed only. */
export function FrictionPictures({ version, input, stream, name, wide = false, read }: FrictionPicturesProps) {
  const subject = frictionSubject(version, input, stream);

  return (
    <div className={wide ? "grid gap-x-8 lg:grid-cols-2" : ""}>
      {subject ? (
        <>
          <FrictionChartFigure subject={subject} name={name} />
          <GrowthFigure subject={subject} name={name} />
          <ShearFigure subject={subject} name={name} />
        </>
      ) : null}
      <DragOverSpeedFigure version={version} input={input} stream={stream} name={name} read={read} />
    </div>
  );
}
