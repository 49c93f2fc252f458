import type { LineKind } from "@/lib/vocabulary/lines";
import type { DimensionName } from "@/lib/units/dimensions";

export interface Choice {
  value: string;
  label: string;
  /** What choosing it means, where the label alone doesn't say. */
  help?: string;
  /** What choosing it writes into other fields, which can be changed afterwards unless the schema says no. */
  sets?: Readonly<Record<string, string | number>>;
}

/** Everything a form, a difference sheet and a canonical text need to know of a field. */
export type FieldType =
  | { type: "text"; longest: number; multiline?: boolean }
  /** Stored as a Quantity. */
  | { type: "quantity"; dimension: DimensionName }
  /** A plain number without dimension. */
  | { type: "number"; whole?: boolean; unit?: string }
  /** Stored from 0 to 1, shown in per cent. */
  | { type: "fraction" }
  /** Whole hundredths of a newton, shown in newtons. */
  | { type: "newtons" }
  | { type: "yes-no" }
  | { type: "choice"; choices: readonly Choice[] }
  /** One of the choices, stored as a number. */
  | { type: "number-choice"; choices: readonly { value: number; label: string }[] }
  /** The number of another line of this budget. */
  | { type: "reference"; to: LineKind }
  | { type: "references"; to: LineKind }
  | { type: "person" }
  | { type: "date" }
  /** A file by its name and the SHA-256 of its content; without one the field is missing. */
  | { type: "file" }
  /** `keyedBy`: the columns that name an entry, so that it keeps its name when others come and go. */
  | { type: "list"; entry: string; of: readonly FieldSpec[]; keyedBy?: readonly string[] }
  | { type: "record"; of: readonly FieldSpec[] };

export interface FieldSpec {
  key: string;
  label: string;
  help?: string;
  /** The symbol a hand calculation uses for it. */
  symbol?: string;
  type: FieldType;
  /** May be left empty, which is stored as null (lists and texts: as empty). */
  optional?: boolean;
  /** The form shows it only while another field has one of these values. */
  shownWhen?: { field: string; is: readonly (string | boolean | null)[] };
  /** Set by the application, never typed. */
  fixed?: boolean;
}

/** What a choice writes into the other fields of its body. */
export function setByChoice({ type }: FieldSpec, value: unknown): Readonly<Record<string, string | number>> {
  if (type.type !== "choice") return {};
  return type.choices.find((choice) => choice.value === value)?.sets ?? {};
}
