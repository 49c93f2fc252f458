import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { RemarkFlag } from "@/app/_components/remark-flag";
import { RevisionLetter } from "@/app/_components/revision-letter";
import { type Reading, readChange, readChangeNumber } from "@/lib/evaluation/measures/reading";
import type { MovedView, SidesEffect } from "@/lib/proposals/sheet-views";
import type { FieldChangeRow, LineChangeView, PersonView } from "@/lib/proposals/views";
import type { EditOperation } from "@/lib/vocabulary/lines";
import { LINE_KIND_NAMES } from "@/lib/vocabulary/lines";

import { ComparedLines } from "./compared-text";
import { FieldsThatStay } from "./fields-that-stay";
import { MovedMark } from "./moved-notice";
import { RemarkDialog } from "./remark-dialog";

const OPERATION_WORDS: Record<EditOperation, string> = {
  add: "added",
  revise: "revised",
  retire: "retired",
  reinstate: "reinstated",
};

const COLUMNS = 5;

interface ChangeTableProps {
  proposalId: number;
  line: LineChangeView;
  baseIssue: number;
  /** Of the worst operating point. */
  effectReading: Reading;
  /** The issue beside the base that effects are shown on; null where that is the base. */
  todayIssue: number | null;
  moved: MovedView | null;
  /** Leaves out what did not move since the reader last looked. */
  onlyMoved: boolean;
  mayRemark: boolean;
  people: readonly PersonView[];
}

/** One line of the change sheet: every field as it was and as it is to be, changed rows with a bar in the margin. */
export function ChangeTable(props: ChangeTableProps) {
  const { line, baseIssue, todayIssue, moved, onlyMoved, effectReading: reading, ...remarks } = props;
  const added = line.operation === "add";
  const marks = moved?.fields.filter(({ kind, number }) => kind === line.kind && number === line.number) ?? [];
  const markOf = (row: FieldChangeRow) => marks.find(({ field }) => field === row.field) ?? null;
  const rows = line.rows.filter((row) => !onlyMoved || markOf(row) !== null);
  if (rows.length === 0) return null;
  // At issue is also what somebody remarked on, what moved since the last look, and what would be put back today.
  const isAtIssue = (row: FieldChangeRow) =>
    row.changed || row.remarkNumbers.length > 0 || markOf(row) !== null || (row.effect.onToday ?? 0) !== 0;
  const staying = rows.filter((row) => !isAtIssue(row));
  const issues = { base: baseIssue, today: todayIssue };
  const fieldRow = (row: FieldChangeRow) => (
    <FieldRow
      key={row.field}
      line={line}
      row={row}
      issues={issues}
      moved={markOf(row)}
      reading={reading}
      {...remarks}
    />
  );

  return (
    <section className="mt-7" aria-label={`${line.number} ${line.name}, ${OPERATION_WORDS[line.operation]}`}>
      <LineHeading line={line} baseIssue={baseIssue} todayIssue={todayIssue} effectReading={reading} />
      <Table caption={`Fields of ${line.number} ${line.name}`} narrow="stack">
        <TableHead>
          <Head className="w-[27%]">Field</Head>
          <Head className="w-[29%]">{added ? "Was" : `Was, issue ${baseIssue}`}</Head>
          <Head className="w-[29%]">To be</Head>
          <Head numeric unit={reading.unit}>
            {todayIssue === null ? "Effect" : `Effect, issue ${baseIssue}`}
          </Head>
          {todayIssue === null ? null : (
            <Head numeric unit={reading.unit}>
              Issue {todayIssue}
            </Head>
          )}
          <Head>
            <span className="sr-only">Remarks</span>
          </Head>
        </TableHead>
        <tbody>{rows.filter(isAtIssue).map(fieldRow)}</tbody>
        {staying.length > 0 ? (
          <FieldsThatStay
            count={staying.length}
            of={`${line.number} ${line.name}`}
            columns={todayIssue === null ? COLUMNS : COLUMNS + 1}
          >
            {staying.map(fieldRow)}
          </FieldsThatStay>
        ) : null}
      </Table>
    </section>
  );
}

type LineHeadingProps = Pick<ChangeTableProps, "line" | "baseIssue" | "todayIssue" | "effectReading">;

function LineHeading({ line, effectReading, ...issues }: LineHeadingProps) {
  return (
    <div className="mb-1 flex flex-wrap items-baseline gap-x-2.5 gap-y-1">
      <h2 className="text-lg">
        {line.kind === "item" ? "" : `${LINE_KIND_NAMES[line.kind]} `}
        {line.number} {line.name}
      </h2>
      {line.baseLetter ? (
        <>
          <RevisionLetter letter={line.baseLetter} /> <span className="font-semibold">becomes</span>
        </>
      ) : null}
      <RevisionLetter letter={line.nextLetter} />
      <span className="ml-auto text-sm text-ink-2">
        {OPERATION_WORDS[line.operation]}
        {effectText(line.effect, effectReading, issues)}
      </span>
    </div>
  );
}

function effectText(
  { onBase, onToday }: SidesEffect,
  reading: Reading,
  { baseIssue, todayIssue }: Pick<ChangeTableProps, "baseIssue" | "todayIssue">,
): string {
  const text = (newtons: number | null) => (newtons === null ? "not computed" : readChange(reading, newtons));
  if (todayIssue === null) return onBase === null ? "" : `, ${readChange(reading, onBase)}`;
  if (onBase === null && onToday === null) return "";

  return `, ${text(onBase)} on issue ${baseIssue}, ${text(onToday)} on issue ${todayIssue}`;
}

interface FieldRowProps {
  proposalId: number;
  line: LineChangeView;
  row: FieldChangeRow;
  reading: Reading;
  issues: { base: number; today: number | null };
  moved: MovedView["fields"][number] | null;
  mayRemark: boolean;
  people: readonly PersonView[];
}

function FieldRow({ proposalId, line, row, reading, issues, moved, mayRemark, people }: FieldRowProps) {
  // What stays as it is takes one line on a narrow screen, so that what changes is found.
  const wideOnly = row.changed || moved ? "" : "max-sm:!hidden";

  return (
    <Row>
      <RowHead label="Field" className={`text-ink-2 ${row.changed ? "change-bar" : ""}`}>
        {row.label}
        {row.changed ? <span className="sr-only">, changed</span> : null}
        {moved ? <MovedMark saw={moved.saw} /> : null}
      </RowHead>
      <Cell label="Was" className={`whitespace-pre-line text-ink-2 ${wideOnly}`}>
        <ValueText value={row.was} unit={row.unit} />
      </Cell>
      <Cell
        label={row.changed ? "To be" : "Stays"}
        className={`whitespace-pre-line ${row.changed ? "font-semibold" : ""}`}
      >
        <ValueText value={row.toBe} unit={row.unit} />
        {row.compared ? <ComparedLines compared={row.compared} title="Line by line" /> : null}
      </Cell>
      <EffectCell
        newtons={row.effect.onBase}
        reading={reading}
        label={issues.today === null ? "Effect" : `Issue ${issues.base}`}
      />
      {issues.today === null ? null : (
        <EffectCell newtons={row.effect.onToday} reading={reading} label={`Issue ${issues.today}`} />
      )}
      <Cell className="max-sm:!flex">
        <span className="flex flex-wrap items-center justify-end gap-1.5">
          {row.remarkNumbers.map((number) => (
            <a key={number} href={`#remark-${number}`} aria-label={`Remark ${number} on ${row.label}`}>
              <RemarkFlag>R{number}</RemarkFlag>
            </a>
          ))}
          {mayRemark ? (
            <RemarkDialog
              proposalId={proposalId}
              target={{ line: { kind: line.kind, number: line.number }, field: row.field }}
              title={`Remark on ${line.number} ${row.label}`}
              people={people}
              discreet
            />
          ) : null}
        </span>
      </Cell>
    </Row>
  );
}

interface EffectCellProps {
  newtons: number | null;
  reading: Reading;
  label: string;
}

function EffectCell({ newtons, reading, label }: EffectCellProps) {
  return (
    <Cell label={label} numeric className={`text-water ${newtons === null ? "max-sm:!hidden" : ""}`}>
      {newtons === null ? "" : readChangeNumber(reading, newtons)}
    </Cell>
  );
}

function ValueText({ value, unit }: { value: string | null; unit: string | null }) {
  if (value === null || value === "") return <span aria-label="empty">–</span>;

  return (
    <>
      {value}
      {unit ? `\u2009${unit}` : ""}
    </>
  );
}
