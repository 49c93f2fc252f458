"use client";

import type { Body, Json } from "@/app/_components/line-fields/body";
import type { EditorNames } from "@/app/_components/line-fields/editor-names";
import { FieldInput } from "@/app/_components/line-fields/field-input";
import { withMethod } from "@/app/_components/line-fields/new-edit";
import { type FieldSpec, setByChoice } from "@/lib/evaluation/lines/field-spec";
import { fieldWords } from "@/lib/evaluation/lines/named-fault";
import { withoutHidden } from "@/lib/evaluation/lines/field-rows";
import { FINISH_CATALOGUE } from "@/lib/products/finish-catalogue";
import type { FieldFault } from "@/lib/vocabulary/refusal";

import { itemFields, pointFields, type Side, type TrialSetting } from "../_trial/setting";

interface SettingFormProps {
  side: Side;
  setting: TrialSetting;
  onChange: (setting: TrialSetting) => void;
  faults: readonly FieldFault[];
}

/** Finishes of the catalogue that every product starts from. */
const NAMES: EditorNames = {
  lines: FINISH_CATALOGUE.map(({ number, body }) => ({ kind: "finish", number, name: body.name })),
  people: [],
  owners: [],
};

const MEMBERS_SUM: FieldSpec = {
  key: "membersSum",
  label: "Sum of its members",
  symbol: "ΣB",
  help: "A trial has no other items: type what they come to.",
  type: { type: "quantity", dimension: "force" },
};

/** One setting: the stream, then the method with its fields. */
export function SettingForm({ side, setting, onChange, faults }: SettingFormProps) {
  const { point, item, membersSum } = setting;
  const letter = side.toUpperCase();

  return (
    <section aria-label={`Setting ${letter}`} className="min-w-0">
      <h2 className="border-b border-ink pb-1 text-lg">{letter}</h2>
      <FieldGroup
        legend="Stream"
        path="point"
        side={side}
        specs={pointFields(point)}
        body={point}
        faults={faults}
        onField={(spec, value) => onChange({ ...setting, point: withChoice("operating_point", point, spec, value) })}
      />
      <FieldGroup
        legend="Item"
        path="item"
        side={side}
        specs={itemFields(item)}
        body={item}
        faults={faults}
        onField={(spec, value) => onChange({ ...setting, item: withChoice("item", item, spec, value) })}
      />
      {item.method === "share" ? (
        <FieldGroup
          legend="In place of a budget"
          path=""
          side={side}
          specs={[MEMBERS_SUM]}
          body={{ membersSum }}
          faults={faults}
          onField={(_, value) => onChange({ ...setting, membersSum: value })}
        />
      ) : null}
    </section>
  );
}

function withChoice(kind: "operating_point" | "item", body: Body, spec: FieldSpec, value: Json): Body {
  if (spec.key === "method" && typeof value === "string") return withMethod(body, value, null);
  // A catalogued finish brings its roughness; without one a typed roughness is asked, smooth to begin with.
  const typed: Body = spec.key === "finish" && value === null ? { roughness: { value: 0, entered: "0" } } : {};
  return withoutHidden(kind, { ...body, [spec.key]: value, ...setByChoice(spec, value), ...typed });
}

interface FieldGroupProps {
  legend: string;
  /** Where the faults of these fields stand; empty at the top. */
  path: string;
  side: Side;
  specs: readonly FieldSpec[];
  body: Body;
  faults: readonly FieldFault[];
  onField: (spec: FieldSpec, value: Json) => void;
}

function FieldGroup({ legend, path, side, specs, body, faults, onField }: FieldGroupProps) {
  const pathOf = (key: string) => (path === "" ? key : `${path}.${key}`);

  return (
    <fieldset className="mt-3 min-w-0">
      <legend className="mb-1.5 text-sm font-semibold">{legend}</legend>
      <div className="grid gap-x-5 gap-y-3 sm:grid-cols-2">
        {specs.map((spec) => (
          <FieldInput
            key={`${spec.key} ${String(body.method ?? "")}`}
            spec={spec}
            value={body[spec.key]}
            onChange={(value) => onField(spec, value)}
            names={NAMES}
            faultAt={(at) =>
              isBlank(body[spec.key]) ? undefined : faults.find((fault) => fault.path === at)?.sentence
            }
            path={pathOf(spec.key)}
            id={`${side}-${spec.key}`}
          />
        ))}
      </div>
      <StillMissing specs={specs} body={body} faults={faults} pathOf={pathOf} />
    </fieldset>
  );
}

/** An empty field is no mistake while a form is filled in. */
function isBlank(value: Json | undefined): boolean {
  return value === null || value === undefined || value === "";
}

interface StillMissingProps extends Pick<FieldGroupProps, "specs" | "body" | "faults"> {
  pathOf: (key: string) => string;
}

/** What keeps it from a result and stands at no field above: what is empty yet, and what another choice hid. */
function StillMissing({ specs, body, faults, pathOf }: StillMissingProps) {
  const kind = pathOf("") === "point." ? "operating_point" : "item";
  const missing = specs.flatMap(({ key, label }) => {
    const fault = faults.find(({ path }) => path === pathOf(key));
    return fault && isBlank(body[key]) ? [`${label}: ${fault.sentence}`] : [];
  });
  const hidden = faults.flatMap(({ path, sentence }) => {
    const [, key = ""] = path.split(".");
    const isHere = path.startsWith(pathOf("")) && pathOf("") !== "";
    if (!isHere || specs.some((spec) => spec.key === key)) return [];
    return [[...fieldWords({ kind, body }, key), sentence].join(": ")];
  });
  const texts = [...missing, ...hidden];
  if (texts.length === 0) return null;

  return (
    <div role="status" className="mt-2 border-l-4 border-ink px-3 py-1 text-sm">
      Still needed:
      <ul>
        {texts.map((text) => (
          <li key={text}>{text}</li>
        ))}
      </ul>
    </div>
  );
}
