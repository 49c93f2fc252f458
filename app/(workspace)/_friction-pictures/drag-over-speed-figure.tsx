import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { MethodInput } from "@/lib/evaluation/document/schema";
import type { StreamState } from "@/lib/evaluation/methods/stream-state";
import { formatNewtons, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { formatSignificant } from "@/lib/units/format-number";
import { formatResult } from "@/lib/units/format-quantity";

import { dragAt, dragOverSpeed, dragOverSpeedLayout } from "./drag-over-speed";
import { Plot } from "./plot";

interface DragOverSpeedFigureProps {
  version: number;
  input: MethodInput;
  stream: StreamState;
  name: string;
}

/** The drag of an item in the same fluid at other speeds. */
export function DragOverSpeedFigure({ version, input, stream, name }: DragOverSpeedFigureProps) {
  const drag = dragAt(version, input, stream);
  if (drag === null) return null;
  const points = dragOverSpeed(version, input, stream);
  const isBroken = points.some((point) => point.drag === null);

  return (
    <FigureWithTable
      summary={`Drag over speed: ${name} has ${formatNewtons(drag)} at ${formatResult(stream.speed, "m/s")}.`}
      picture={<Plot layout={dragOverSpeedLayout([{ word: null, points, own: { speed: stream.speed, drag } }])} />}
      caption={
        <span>
          Drag by the method over the speed of the operating point, in the same fluid.
          {isBroken ? " Where the method refuses the item there is no line." : ""}
        </span>
      }
      table={<SpeedTable version={version} input={input} stream={stream} name={name} />}
    />
  );
}

const SPEEDS_OF_TABLE = 16;

function SpeedTable({ version, input, stream, name }: DragOverSpeedFigureProps) {
  return (
    <Table caption={`Drag of ${name} over speed`}>
      <TableHead>
        <Head unit="m/s">Speed</Head>
        <Head numeric unit="N">
          Drag
        </Head>
      </TableHead>
      <tbody>
        {dragOverSpeed(version, input, stream, SPEEDS_OF_TABLE).map(({ speed, drag }) => (
          <Row key={speed}>
            <RowHead>{formatSignificant(speed)}</RowHead>
            <Cell numeric>{drag === null ? "refused" : formatNewtonsNumber(drag)}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
