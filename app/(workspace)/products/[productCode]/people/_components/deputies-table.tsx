import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { dayText } from "@/app/_components/utc-text";
import { UtcTime } from "@/app/_components/utc-time";
import type { DeputyView } from "@/lib/products/queries";

import { EndDeputy } from "./end-deputy";

interface DeputiesTableProps {
  deputies: readonly DeputyView[];
  /** The day on which the page is read, in the product's time zone. */
  today: string;
  readerId: number;
}

/** Who stands in for whom on which days; ranges that are over stay readable. */
export function DeputiesTable({ deputies, today, readerId }: DeputiesTableProps) {
  return (
    <Table caption="Deputies, latest range of days first" narrow="stack">
      <TableHead>
        <Head>Deputy</Head>
        <Head>Signs for</Head>
        <Head>First day</Head>
        <Head>Last day</Head>
        <Head>Now</Head>
      </TableHead>
      <tbody>
        {deputies.map((deputy) => (
          <Row key={deputy.deputyshipId} className={isOver(deputy, today) ? "text-ink-2" : undefined}>
            <RowHead label="Deputy">{deputy.deputy.name}</RowHead>
            <Cell label="Signs for">{deputy.holder.name}</Cell>
            <Cell label="First day">{dayText(deputy.fromDay)}</Cell>
            <Cell label="Last day">{dayText(deputy.untilDay)}</Cell>
            <Cell label="Now">
              <NowText deputy={deputy} today={today} />
              {deputy.holder.id === readerId && !isOver(deputy, today) ? <EndDeputy deputy={deputy} /> : null}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

function isOver({ endedAt, untilDay }: DeputyView, today: string): boolean {
  return endedAt !== null || untilDay < today;
}

function NowText({ deputy, today }: { deputy: DeputyView; today: string }) {
  if (deputy.endedAt) {
    return (
      <>
        ended <UtcTime at={deputy.endedAt} />
      </>
    );
  }
  if (deputy.untilDay < today) return <>over</>;

  return <span className="mr-3">{deputy.fromDay > today ? "to come" : "in force"}</span>;
}
