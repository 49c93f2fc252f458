import type { Route } from "next";
import Link from "next/link";

import { MarkdownText } from "@/app/_components/markdown-text";
import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { UtcTime } from "@/app/_components/utc-time";
import type { ReserveHistory, ReserveMove } from "@/lib/budget/reserve-history";
import { formatHundredths, formatNewtonsChangeNumber } from "@/lib/units/format-newtons";
import type { UnitSystem } from "@/lib/units/us-customary";

import { PointLinks } from "@/app/(workspace)/products/[productCode]/_components/point-links";
import { approvedBy, proposedBy } from "@/app/(workspace)/products/[productCode]/_components/sheet-fields";
import { InUsUnits } from "@/app/(workspace)/products/[productCode]/_components/in-us-units";

interface ReserveSectionProps {
  histories: readonly ReserveHistory[];
  /** The operating point that the address asks for. */
  asked: string | undefined;
  units: UnitSystem;
  productCode: string;
  hrefOf: (operatingPoint: string) => string;
  /** Whether the reader could propose a draw. */
  mayDraw: boolean;
}

/** What is held back of the limit, and every issue that drew on it or added to it. */
export function ReserveSection({ histories, asked, units, productCode, hrefOf, mayDraw }: ReserveSectionProps) {
  const shown = histories.find(({ operatingPoint }) => operatingPoint === asked) ?? histories[0];
  if (!shown) return null;
  const { operatingPoint, balance, moves } = shown;

  return (
    <section aria-labelledby="reserve" className="mt-7">
      <SectionHeading id="reserve" aside={`${formatHundredths(balance)} N at ${operatingPoint}`}>
        Reserve and its history
      </SectionHeading>
      <PointLinks points={histories} chosen={operatingPoint} hrefOf={(point) => `${hrefOf(point)}#reserve`} />
      <p className="mb-2 text-sm text-ink-2">{standingWords(shown)}</p>
      <Table caption={`Reserve at ${operatingPoint}, issue by issue`} narrow="stack">
        <TableHead>
          <Head>Issue</Head>
          <Head numeric unit="N">
            Reserve before
          </Head>
          <Head numeric unit="N">
            Draw (−) or addition (+)
          </Head>
          <Head numeric unit="N">
            Balance
          </Head>
          <Head className="w-[38%]">Proposal and reason</Head>
          <Head>Proposed, signed</Head>
        </TableHead>
        <tbody>
          {moves.map((move) => (
            <MoveRow key={move.issue.number} move={move} units={units} productCode={productCode} />
          ))}
        </tbody>
      </Table>
      {mayDraw ? (
        <p className="mt-2 text-sm print:hidden">
          To draw on the reserve, revise the terms in{" "}
          <Link className="link" href={`/products/${productCode}/proposals` as Route}>
            a proposal
          </Link>{" "}
          and say why: what is drawn becomes unallocated when it is approved.
        </p>
      ) : null}
    </section>
  );
}

function standingWords({ operatingPoint, isReference, moves }: ReserveHistory): string {
  const where = isReference
    ? `${operatingPoint} is the reference: allocations, unallocated and this reserve make up its limit.`
    : moves.at(-1)?.isStated
      ? `${operatingPoint} has a reserve of its own in the terms.`
      : `The terms name no reserve at ${operatingPoint}: it scales with the limit.`;
  return `${where} ${
    moves.length < 2
      ? "Nothing was drawn on it or added to it since it was set."
      : "Issues that are not listed left it as it was."
  }`;
}

interface MoveRowProps {
  move: ReserveMove;
  units: UnitSystem;
  productCode: string;
}

function MoveRow({ move, units, productCode }: MoveRowProps) {
  const { issue, before, change, balance } = move;

  return (
    <Row data-reserve-issue={issue.number}>
      <RowHead label="Issue">
        {issue.number}
        <span className="block text-xs text-ink-2">
          <UtcTime at={issue.at} />
        </span>
      </RowHead>
      <Cell numeric label="Before, N">
        {before === null ? "–" : formatHundredths(before)}
        {before === null ? null : <InUsUnits value={before / 100} dimension="force" units={units} />}
      </Cell>
      <Cell numeric label="Draw or addition, N">
        {formatNewtonsChangeNumber(change / 100)}
        <span className="block text-xs text-ink-2">{moveWord(move)}</span>
      </Cell>
      <Cell numeric label="Balance, N" className="font-semibold">
        {formatHundredths(balance)}
        <InUsUnits value={balance / 100} dimension="force" units={units} />
      </Cell>
      <Cell label="Why">
        <Why move={move} productCode={productCode} />
      </Cell>
      <Cell label="By">
        {proposedBy(issue)}
        <span className="block text-xs text-ink-2">{approvedBy(issue)}</span>
      </Cell>
    </Row>
  );
}

function moveWord({ before, change, isStated }: ReserveMove): string {
  if (before === null) return "set";
  if (!isStated) return "with the limit";
  return change < 0 ? "draw" : "addition";
}

function Why({ move: { issue, reason, limitBefore, limit }, productCode }: Pick<MoveRowProps, "move" | "productCode">) {
  const { proposal } = issue;

  return (
    <>
      {proposal ? (
        <Link className="link" href={`/products/${productCode}/proposals/${proposal.number}` as Route}>
          {proposal.label} {proposal.title}
        </Link>
      ) : (
        "established"
      )}
      {reason === null ? null : (
        <div className="text-sm text-ink-2">
          <MarkdownText text={reason} />
        </div>
      )}
      {limitBefore === null || limitBefore === limit ? null : (
        <span className="block text-xs text-ink-2">
          The limit moved along: {formatHundredths(limitBefore)} → {formatHundredths(limit)} N.
        </span>
      )}
    </>
  );
}
