import { Cell, Row, RowHead } from "@/app/_components/table";
import type { FieldRow } from "@/lib/evaluation/lines/field-rows";

/** The fields of a line as rows: what a proposal would change and a remark be tied to. */
export function FieldTable({ rows, caption }: { rows: readonly FieldRow[]; caption: string }) {
  return (
    <table className="w-full border-collapse border-t border-ink text-table">
      <caption className="sr-only">{caption}</caption>
      <tbody>
        {rows.map(({ field, label, text, unit, entered }) => (
          <Row key={field}>
            <RowHead className="w-[38%] text-ink-2">{label}</RowHead>
            <Cell className="break-words">
              {text}
              {unit ? ` ${unit}` : ""}
              {entered ? <span className="ml-2 text-xs text-ink-2">typed: {entered}</span> : null}
            </Cell>
          </Row>
        ))}
      </tbody>
    </table>
  );
}
