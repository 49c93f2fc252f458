import { EmptyNote } from "@/app/_components/empty-note";
import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { BudgetAt } from "@/lib/budget/views";
import { type Reading, readNumber } from "@/lib/evaluation/measures/reading";

import {
  type AllocatedItem,
  allocationsLayout,
} from "@/app/(workspace)/products/[productCode]/_pictures/allocations-layout";
import { AllocationsPicture } from "@/app/(workspace)/products/[productCode]/_pictures/allocations-picture";
import { inUnit } from "./in-unit";

interface AllocationsFigureProps {
  budget: BudgetAt;
  /** Of the reference operating point. */
  reading: Reading;
}

/** Every item against what it may use, at the reference operating point, where allocations are set. */
export function AllocationsFigure({ budget: { allocations, results }, reading }: AllocationsFigureProps) {
  const point = results.points.find(({ operatingPoint }) => operatingPoint === allocations.operatingPoint);
  const items = allocations.lines.flatMap((line): AllocatedItem[] => {
    const result = point?.items.find(({ item, refused }) => line.kind === "item" && item === line.number && !refused);
    return result ? [{ ...line, basic: result.basic, predicted: result.predicted }] : [];
  });
  if (items.length === 0) {
    return <EmptyNote title="No items yet.">Items come by proposals: start a draft and add one.</EmptyNote>;
  }
  const over = items.filter(({ marginHundredths }) => marginHundredths !== null && marginHundredths < 0);

  return (
    <FigureWithTable
      summary={
        `${items.length} items against their allocations at ${allocations.operatingPoint}; over: ` +
        `${over.length === 0 ? "none" : over.map(({ number, name }) => `${number} ${name}`).join(", ")}.`
      }
      picture={<AllocationsPicture layout={allocationsLayout(items, reading.perNewton)} reading={reading} />}
      caption={`Every force${inUnit(reading)}. Solid: basic; hatched: growth; post: allocation; hatched the other way, beyond the post: over. At the right the margin; a dash where there is no allocation.`}
      table={<AllocationsTable items={items} reading={reading} />}
    />
  );
}

function AllocationsTable({ items, reading }: { items: readonly AllocatedItem[]; reading: Reading }) {
  return (
    <Table caption={`The numbers of the picture${inUnit(reading)}`}>
      <TableHead>
        <Head>Item</Head>
        <Head numeric>Basic</Head>
        <Head numeric>Predicted</Head>
        <Head numeric>Allocation</Head>
        <Head numeric>Margin</Head>
      </TableHead>
      <tbody>
        {items.map(({ number, name, basic, predicted, allocationHundredths, marginHundredths }) => (
          <Row key={number}>
            <RowHead>
              {number} {name}
            </RowHead>
            <Cell numeric>{readNumber(reading, basic)}</Cell>
            <Cell numeric>{readNumber(reading, predicted)}</Cell>
            <Cell numeric>
              {allocationHundredths === null ? "none" : readNumber(reading, allocationHundredths / 100)}
            </Cell>
            <Cell numeric>{marginHundredths === null ? "–" : readNumber(reading, marginHundredths / 100)}</Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}
