import { RevisionLetter } from "@/app/_components/revision-letter";
import { Cell, Row, RowHead } from "@/app/_components/table";
import type { Reading } from "@/lib/evaluation/measures/reading";

import type { GroupRow } from "@/app/(workspace)/products/[productCode]/_sheet/budget-sheet";
import { FigureCells } from "./figure-cells";

interface GroupTableRowProps {
  row: GroupRow;
  isReference: boolean;
  reading: Reading;
}

/** A group ahead of what it holds: sums over it and its subgroups. */
export function GroupTableRow({ row, isReference, reading }: GroupTableRowProps) {
  const { number, name, letter, depth, members } = row;

  return (
    <Row band data-group={number}>
      <RowHead className="font-semibold">
        <span className="block" style={{ paddingLeft: `${depth * 0.9}rem` }}>
          <span className="mr-1.5 font-normal text-ink-2">{number}</span>
          {name}
        </span>
      </RowHead>
      <Cell className="text-xs font-normal text-ink-2 max-sm:hidden">
        {members.length === 0 ? "no items yet" : `${members.length} ${members.length === 1 ? "item" : "items"}`}
      </Cell>
      <Cell className="font-normal">
        <RevisionLetter letter={letter} />
      </Cell>
      <FigureCells row={row} isReference={isReference} reading={reading} />
    </Row>
  );
}
