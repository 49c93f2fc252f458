import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { MethodInput } from "@/lib/evaluation/document/schema";
import { readNumber, readText } from "@/lib/evaluation/measures/reading";
import type { StreamState } from "@/lib/evaluation/methods/stream-state";
import { formatSignificant } from "@/lib/units/format-number";
import { formatResult } from "@/lib/units/format-quantity";

import { dragAt, dragOverSpeed, dragOverSpeedLayout, READ_IN_SI, type SpeedReading } from "./drag-over-speed";
import { Plot } from "./plot";

interface DragOverSpeedFigureProps {
  version: number;
  input: MethodInput;
  stream: StreamState;
  name: string;
  read?: SpeedReading;
}

/** The drag of an item in the same fluid at other speeds. */
export function DragOverSpeedFigure({ version, input, stream, name, read = READ_IN_SI }: DragOverSpeedFigureProps) {
  const drag = dragAt(version, input, stream);
  if (drag === null) return null;
  const points = dragOverSpeed(version, input, stream);
  const isBroken = points.some((point) => point.drag === null);

  return (
    <FigureWithTable
      summary={`Drag over speed: ${name} has ${readText(read.at(stream.speed), drag)} at ${formatResult(stream.speed * read.speed.perSi, read.speed.unit)}.`}
      picture={
        <Plot layout={dragOverSpeedLayout([{ word: null, points, own: { speed: stream.speed, drag } }], read)} />
      }
      caption={
        <span>
          Drag by the method over the speed of the operating point, in the same fluid.
          {read.at(2 * stream.speed).perNewton === read.at(stream.speed).perNewton
            ? ""
            : " Each force is read by the stream of its speed."}
          {isBroken ? " Where the method refuses the item there is no line." : ""}
        </span>
      }
      table={<SpeedTable version={version} input={input} stream={stream} name={name} read={read} />}
    />
  );
}

const SPEEDS_OF_TABLE = 16;

function SpeedTable({ version, input, stream, name, read = READ_IN_SI }: DragOverSpeedFigureProps) {
  return (
    <Table caption={`Drag of ${name} over speed`}>
      <TableHead>
        <Head unit={read.speed.unit}>Speed</Head>
        <Head numeric unit={read.at(stream.speed).unit}>
          Drag
        </Head>
      </TableHead>
      <tbody>
        {dragOverSpeed(version, input, stream, SPEEDS_OF_TABLE).map(({ speed, drag }) => (
          <Row key={speed}>
            <RowHead>{formatSignificant(speed * read.speed.perSi)}</RowHead>
            <Cell numeric>{drag === null ? "refused" : readNumber(read.at(speed), drag)}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
