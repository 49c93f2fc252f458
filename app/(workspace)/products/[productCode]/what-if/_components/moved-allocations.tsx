import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { MovedAllocation } from "@/lib/proposals/reading/what-if";
import { formatHundredths } from "@/lib/units/format-newtons";

/** The rows of the allocations sheet that the set would move, limit and reserve among them. */
export function MovedAllocations({ rows }: { rows: readonly MovedAllocation[] }) {
  if (rows.length === 0) return null;

  return (
    <section className="mt-7">
      <SectionHeading aside="kept and shown in newtons, in which they add up to the limit">
        Allocations that move
      </SectionHeading>
      <Table caption="Allocations that move" narrow="stack">
        <TableHead>
          <Head>Holder</Head>
          <Head numeric unit="N">
            Was
          </Head>
          <Head numeric unit="N">
            To be
          </Head>
        </TableHead>
        <tbody>
          {rows.map(({ name, was, toBe }) => (
            <Row key={name}>
              <RowHead label="Holder" className="change-bar">
                {name}
              </RowHead>
              <Cell numeric label="Was">
                {heldText(was)}
              </Cell>
              <Cell numeric label="To be" className="font-semibold">
                {heldText(toBe)}
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
    </section>
  );
}

function heldText(hundredths: number | null): string {
  return hundredths === null ? "none" : formatHundredths(hundredths);
}
