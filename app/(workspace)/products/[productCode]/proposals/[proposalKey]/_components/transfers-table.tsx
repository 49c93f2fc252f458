import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { HolderView, TransferView } from "@/lib/proposals/views";
import { formatHundredths } from "@/lib/units/format-newtons";

/** Allocation that moves, giver by giver, in the order in which it is applied. */
export function TransfersTable({ transfers }: { transfers: readonly TransferView[] }) {
  if (transfers.length === 0) return null;

  return (
    <section className="mt-7">
      <SectionHeading>Transfers of allocation</SectionHeading>
      <Table caption="Transfers of allocation" narrow="stack">
        <TableHead>
          <Head>From</Head>
          <Head>To</Head>
          <Head numeric unit="N">
            Moves
          </Head>
        </TableHead>
        <tbody>
          {transfers.map((transfer, at) => (
            <Row key={at}>
              <RowHead label="From" className="change-bar">
                {holderText(transfer.giver)}
              </RowHead>
              <Cell label="To">{holderText(transfer.receiver)}</Cell>
              <Cell numeric label="Moves" className="font-semibold">
                {formatHundredths(transfer.hundredths)}
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
    </section>
  );
}

function holderText({ kind, number, name }: HolderView): string {
  if (kind === "unallocated") return "unallocated";

  return kind === "group" ? `group ${number} ${name}` : `${number} ${name}`;
}
