import { Cell, Row, RowHead } from "@/app/_components/table";
import type { FieldRow } from "@/lib/evaluation/lines/field-rows";
import type { UnitSystem } from "@/lib/units/us-customary";

interface FieldTableProps {
  rows: readonly FieldRow[];
  caption: string;
  /** Those of the reader; SI where it isn't said. */
  units?: UnitSystem;
}

/** The fields of a line as rows: what a proposal would change and a remark be tied to. */
export function FieldTable({ rows, caption, units = "si" }: FieldTableProps) {
  return (
    <table className="w-full border-collapse border-t border-ink text-table">
      <caption className="sr-only">{caption}</caption>
      <tbody>
        {rows.map(({ field, label, text, unit, entered, us }) => (
          <Row key={field}>
            <RowHead className="w-[38%] text-ink-2">{label}</RowHead>
            <Cell className="break-words">
              {units === "us" && us ? `${us} (${text} ${unit ?? ""})` : `${text}${unit ? ` ${unit}` : ""}`}
              {entered ? <span className="ml-2 text-xs text-ink-2">typed: {entered}</span> : null}
            </Cell>
          </Row>
        ))}
      </tbody>
    </table>
  );
}
