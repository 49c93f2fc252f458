import { FigureWithTable } from "@/app/_components/figure-with-table";
import { RevisionLetter } from "@/app/_components/revision-letter";
import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { ComparedLine, IssueComparison, TrendIssue } from "@/lib/budget/views";
import { formatNewtons, formatNewtonsChange } from "@/lib/units/format-newtons";
import { LINE_KIND_NAMES } from "@/lib/vocabulary/lines";

import { ChangedFields } from "@/app/(workspace)/products/[productCode]/_components/revisions-table";
import { bridgeLayout } from "@/app/(workspace)/products/[productCode]/_pictures/bridge-layout";
import { BridgePicture } from "@/app/(workspace)/products/[productCode]/_pictures/bridge-picture";
import { proposalBridge } from "@/app/(workspace)/products/[productCode]/_pictures/proposal-bridge";

import { ProposalBridgeFigure } from "./proposal-bridge-figure";

interface ComparisonProps {
  comparison: IssueComparison;
  trend: readonly TrendIssue[];
  operatingPoint: string;
  productCode: string;
}

/** What two issues differ in: totals, the items that moved, the lines that have other letters. */
export function Comparison({ comparison, trend, operatingPoint, productCode }: ComparisonProps) {
  const { from, to, lines } = comparison;
  const bridge = proposalBridge(trend, from.number, to.number, operatingPoint);

  return (
    <section aria-labelledby="comparison" className="mt-7">
      <SectionHeading id="comparison" aside={`${lines.length} ${lines.length === 1 ? "line" : "lines"} changed`}>
        Issue {from.number} compared with issue {to.number}
      </SectionHeading>
      {bridge ? (
        <ProposalBridgeFigure
          bridge={bridge}
          from={from.number}
          to={to.number}
          operatingPoint={operatingPoint}
          productCode={productCode}
        />
      ) : null}
      <ItemBridge comparison={comparison} operatingPoint={operatingPoint} />
      <Table caption={`Lines that differ between issue ${from.number} and issue ${to.number}`} narrow="stack">
        <TableHead>
          <Head>Line</Head>
          <Head>Rev</Head>
          <Head>What changed</Head>
        </TableHead>
        <tbody>
          {lines.map((line) => (
            <LineRow key={`${line.kind} ${line.number}`} line={line} to={to.number} />
          ))}
        </tbody>
      </Table>
    </section>
  );
}

function LineRow({ line, to }: { line: ComparedLine; to: number }) {
  const { kind, number, name, letterWas, letterNow, retiredWas, retiredNow, fields } = line;
  const moved = retiredNow && !retiredWas ? "retired" : retiredWas && !retiredNow ? "reinstated" : null;

  return (
    <Row>
      <RowHead label="Line">
        <span className="block text-xs text-ink-2">
          {LINE_KIND_NAMES[kind]} {number}
        </span>
        {name}
      </RowHead>
      <Cell label="Rev" className="whitespace-nowrap">
        {letterWas === null ? null : <RevisionLetter letter={letterWas} />}
        {letterWas === null || letterNow === null ? null : <span aria-hidden> → </span>}
        {letterNow === null ? null : <RevisionLetter letter={letterNow} />}
      </Cell>
      <Cell label="What changed">
        {letterWas === null ? <span className="text-ink-2">new line</span> : null}
        {letterNow === null ? <span className="text-ink-2">does not exist yet in issue {to}</span> : null}
        {moved ? <span className="block">{moved}</span> : null}
        {letterWas === null || letterNow === null || (moved && fields.length === 0) ? null : (
          <ChangedFields fields={fields} />
        )}
      </Cell>
    </Row>
  );
}

/** From one total to the other, item by item, at an operating point that both issues have. */
function ItemBridge({
  comparison: { from, to, items, points },
  operatingPoint,
}: Pick<ComparisonProps, "comparison" | "operatingPoint">) {
  const point = points.find((each) => each.operatingPoint === operatingPoint);
  if (!point || point.predictedWas === null || point.predictedNow === null) {
    return <p className="my-3 text-ink-2">One of the two issues has no operating point {operatingPoint}.</p>;
  }

  const moved = items
    .filter((item) => item.operatingPoint === operatingPoint)
    .map(({ item, name, predictedWas, predictedNow }) => ({
      label: `${item} ${name}`,
      delta: (predictedNow ?? 0) - (predictedWas ?? 0),
    }));
  const [was, now] = [
    { label: `issue ${from.number}`, total: point.predictedWas },
    { label: `issue ${to.number}`, total: point.predictedNow },
  ];

  return (
    <FigureWithTable
      summary={`Predicted at ${operatingPoint} from ${formatNewtons(was.total)} to ${formatNewtons(now.total)}, ${moved.length} items moved.`}
      picture={<BridgePicture layout={bridgeLayout(was, moved, now)} />}
      caption={`The same item by item. Predicted at ${operatingPoint}, newtons; the ruler does not begin at zero.`}
      table={<BridgeTable moved={moved} />}
    />
  );
}

function BridgeTable({ moved }: { moved: readonly { label: string; delta: number }[] }) {
  return (
    <Table caption="Items that moved">
      <TableHead>
        <Head>Item</Head>
        <Head numeric>Change of predicted</Head>
      </TableHead>
      <tbody>
        {moved.map(({ label, delta }) => (
          <Row key={label}>
            <RowHead>{label}</RowHead>
            <Cell numeric>{formatNewtonsChange(delta)}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
