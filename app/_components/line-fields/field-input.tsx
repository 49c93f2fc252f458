"use client";

import { CheckField } from "@/app/_components/check-field";
import { ChoiceField } from "@/app/_components/choice-field";
import { QuantityField } from "@/app/_components/quantity-field";
import { SymbolText } from "@/app/_components/symbol-text";
import { TextArea } from "@/app/_components/text-area";
import { TextField } from "@/app/_components/text-field";
import type { FieldSpec } from "@/lib/evaluation/lines/field-spec";
import { parseQuantity } from "@/lib/units/parse-quantity";
import { DIMENSIONS, type DimensionName } from "@/lib/units/dimensions";
import { formatQuantity } from "@/lib/units/format-quantity";

import { asList, asRecord, type Body, type Json } from "./body";
import type { FieldInputProps } from "./field-input-props";
import { FileInput } from "./file-input";
import { ListInput } from "./list-input";
import { NumberInput } from "./number-input";
import { RecordInput } from "./record-input";
import { ReferencesInput } from "./references-input";

/** The control of one field, drawn from the field catalogue. */
export function FieldInput(props: FieldInputProps) {
  const { spec, value, onChange, names, faultAt, path, id } = props;
  const { type } = spec;
  const texts = {
    id,
    label: labelOf(spec),
    hint: spec.help,
    optional: spec.optional,
    error: faultAt(path),
  };

  switch (type.type) {
    case "quantity":
      return <QuantityInput {...texts} dimension={type.dimension} value={value} onChange={onChange} />;
    case "number":
    case "fraction":
    case "newtons":
      return <NumberInput {...texts} type={type} value={value} onChange={onChange} />;
    case "yes-no":
      return <CheckField {...texts} checked={value === true} onChange={(event) => onChange(event.target.checked)} />;
    case "choice":
      return <SelectInput {...texts} choices={type.choices} value={value} onChange={onChange} empty={spec.optional} />;
    case "number-choice": {
      const choices = type.choices.map((choice) => ({ value: String(choice.value), label: choice.label }));
      return <SelectInput {...texts} choices={choices} value={value} onChange={(text) => onChange(Number(text))} />;
    }
    case "reference": {
      const choices = names.lines
        .filter(({ kind }) => kind === type.to)
        .map(({ number, name }) => ({ value: number, label: `${number} ${name}` }));
      return <SelectInput {...texts} choices={choices} value={value} onChange={onChange} empty />;
    }
    case "person": {
      const choices = names.owners.map((person) => ({ value: String(person.id), label: person.name }));
      return <SelectInput {...texts} choices={choices} value={value} onChange={(text) => onChange(Number(text))} />;
    }
    case "references":
      return <ReferencesInput {...texts} to={type.to} value={value} onChange={onChange} names={names} />;
    case "list":
      return <ListInput {...props} renderField={renderField} texts={texts} list={type} rows={asList(value)} />;
    case "record":
      return (
        <RecordInput {...props} renderField={renderField} texts={texts} fields={type.of} record={asRecord(value)} />
      );
    case "text":
      return type.multiline ? (
        <TextArea
          {...texts}
          rows={3}
          maxLength={type.longest}
          value={String(value ?? "")}
          onChange={(event) => onChange(event.target.value)}
        />
      ) : (
        <TextField
          {...texts}
          maxLength={type.longest}
          autoComplete="off"
          value={String(value ?? "")}
          onChange={(event) => onChange(event.target.value)}
        />
      );
    case "file":
      return props.entry && names.files ? (
        <FileInput {...texts} fieldKey={spec.key} entry={props.entry} shelf={names.files} />
      ) : null;
    case "date":
      return (
        <TextField
          {...texts}
          type="date"
          value={String(value ?? "")}
          onChange={(event) => onChange(event.target.value === "" ? null : event.target.value)}
        />
      );
  }
}

function labelOf({ label, symbol }: FieldSpec) {
  if (!symbol) return label;

  return (
    <>
      {label}, <SymbolText symbol={symbol} />
    </>
  );
}

const renderField = (props: FieldInputProps) => <FieldInput {...props} />;

type Texts = Pick<React.ComponentProps<typeof TextField>, "label" | "hint" | "optional" | "error"> & { id: string };

interface QuantityInputProps extends Texts {
  dimension: DimensionName;
  value: Json | undefined;
  onChange: (value: Json) => void;
}

function QuantityInput({ dimension, value, onChange, ...texts }: QuantityInputProps) {
  return (
    <QuantityField
      {...texts}
      hint={texts.hint ? `${String(texts.hint)} For example ${DIMENSIONS[dimension].example}.` : undefined}
      dimension={dimension}
      value={typedText(value, dimension)}
      onChange={(text) => onChange(typedQuantity(text, dimension, asRecord(value).standardUncertainty))}
    />
  );
}

/** What was typed, also where it can't be read as a quantity. */
function typedText(value: unknown, dimension: DimensionName): string {
  const { entered, value: stored } = asRecord(value);
  if (typeof entered === "string") return entered;

  return typeof stored === "number" ? formatQuantity(stored, dimension) : "";
}

function typedQuantity(text: string, dimension: DimensionName, standardUncertainty: Json | undefined): Json {
  if (text.trim() === "") return null;
  const parsed = parseQuantity(text, dimension);
  const spread: Body = typeof standardUncertainty === "number" ? { standardUncertainty } : {};

  return parsed.ok ? { value: parsed.quantity.value, entered: text, ...spread } : { entered: text, ...spread };
}

interface SelectInputProps extends Texts {
  choices: readonly { value: string; label: string; help?: string }[];
  value: Json | undefined;
  onChange: (value: string | null) => void;
  /** Nothing chosen is stored as null. */
  empty?: boolean;
}

function SelectInput({ choices, value, onChange, empty, ...texts }: SelectInputProps) {
  const current = value === null || value === undefined ? "" : String(value);
  const known = choices.some((choice) => choice.value === current);
  const first = empty || current === "" ? [{ value: "", label: "none" }] : [];
  const lost = current !== "" && !known ? [{ value: current, label: `${current} (no longer there)` }] : [];
  const help = choices.find((choice) => choice.value === current)?.help;

  return (
    <ChoiceField
      {...texts}
      hint={help ?? texts.hint}
      choices={[...first, ...lost, ...choices]}
      value={current}
      onChange={(event) => onChange(event.target.value === "" ? null : event.target.value)}
    />
  );
}
