import { describe, expect, it } from "vitest";
import { textHash } from "@/lib/audit/text-hash";
import { signedText, signingText, type SignedSheet, type SignerBlock } from "@/lib/proposals/review/signing-text";

const FIGURES = {
  limitHundredths: 6600,
  reserveHundredths: 300,
  basic: 54.96,
  growth: 6.63,
  predicted: 61.59,
  margin: 4.41,
  clearOfReserve: 1.41,
  standing: "inside",
} as const;

const NOTE = {
  code: "reynolds-outside-line-range",
  severity: "caution",
  values: { reynolds: 1.03e7, min: 5e5, max: 1e7, line: "prandtl-one-fifth" },
} as const;

/** Every datum that a signing page shows, each with a value of its own. */
const SHEET: SignedSheet = {
  label: "TF2-CP-04",
  title: "Round the trim",
  round: 2,
  roundHash: "a".repeat(64),
  lines: [
    {
      title: "item 070 (Wheel-aperture trim)",
      operation: "revise",
      letterWas: "A",
      letterNow: "B",
      rows: [{ label: "dragCoefficient", was: "0.3", toBe: "0.23" }],
    },
  ],
  transfers: ["0.30 N from the unallocated rest to item 050"],
  voidedEvidence: ["record.pdf, cited for item 070, was voided by Ines: “wrong specimen”"],
  onIssue: 14,
  effects: {
    points: [
      {
        operatingPoint: "OP-1",
        name: "Cruise",
        was: FIGURES,
        now: { ...FIGURES, basic: 53.43, growth: 6.14, predicted: 59.57, margin: 6.43, clearOfReserve: 3.43 },
        predictedDelta: -2.02,
        marginDelta: 2.02,
      },
    ],
    items: [
      {
        item: "070",
        operatingPoint: "OP-1",
        edited: true,
        basicWas: 6.89,
        basicNow: 5.36,
        predictedWas: 7.92,
        predictedNow: 5.9,
        basicDelta: -1.53,
        predictedDelta: -2.02,
        newNotes: [],
        vanishedNotes: [],
        refusedNow: null,
      },
    ],
    followers: [],
  },
  obstacles: ["010 would have to give 0.40 N more than it holds."],
  routing: [
    {
      capacity: "program_manager",
      count: 1,
      signedBySubmitting: false,
      reasons: [{ rule: "predictedRisePercent", sentence: "Predicted rises by 1.27 N at OP-1." }],
    },
  ],
};

const SIGNER: SignerBlock = {
  decision: "approve",
  capacity: "reviewer",
  meaning: "Checked",
  reason: "As agreed",
  printedName: "Ines Reviewer",
  deputyForName: "Elske Reviewer",
  at: "2026-03-01T08:00:00.000Z",
  shownHash: "b".repeat(64),
};

type Path = readonly (string | number)[];

/** Where every single value of a record stands. */
function leaves(value: unknown, path: Path = []): Path[] {
  if (typeof value !== "object" || value === null) return [path];
  return Object.entries(value).flatMap(([key, inner]) =>
    leaves(inner, [...path, Array.isArray(value) ? Number(key) : key]),
  );
}

/** The record with the one value moved by the least that is printed of it. */
function mutated<T>(record: T, path: Path): T {
  const copy = structuredClone(record);
  let place: unknown = copy;
  for (const key of path.slice(0, -1)) place = Reflect.get(Object(place), key);
  const last = path.at(-1) ?? "";
  const value: unknown = Reflect.get(Object(place), last);
  Reflect.set(Object(place), last, moved(value));
  return copy;
}

const OTHER: ReadonlyMap<unknown, unknown> = new Map<unknown, unknown>([
  ["inside", "over"],
  ["revise", "retire"],
  ["program_manager", "reviewer"],
  ["reviewer", "program_manager"],
  ["approve", "disapprove"],
]);

function moved(value: unknown): unknown {
  if (OTHER.has(value)) return OTHER.get(value);
  if (typeof value === "number") return Number.isInteger(value) ? value + 1 : value + 0.01;
  if (typeof value === "boolean") return !value;
  return value === null ? "0.01" : `${String(value)}.`;
}

const hash = (text: string) => textHash("signature", text);
const name = (path: Path) => path.join(".");
/** What a reader sees none of: an empty list, and a refusal that is not there. */
const isShown = (path: Path) => path.at(-1) !== "refusedNow";

describe("the text that is signed", () => {
  it.each(
    leaves(SHEET)
      .filter(isShown)
      .map((path) => [name(path), path] as const),
  )("has another hash when %s changes", (_, path) => {
    const { text, changed } = { text: signingText(SHEET), changed: signingText(mutated(SHEET, path)) };
    expect(hash(changed)).not.toBe(hash(text));
  });

  it.each(leaves(SIGNER).map((path) => [name(path), path] as const))(
    "has another hash when the signer's %s changes",
    (_, path) => {
      const shown = signingText(SHEET);
      expect(hash(signedText(shown, mutated(SIGNER, path)))).not.toBe(hash(signedText(shown, SIGNER)));
    },
  );

  it("has another hash when a note joins, goes, says another value, or refuses", () => {
    const [item] = SHEET.effects.items;
    if (!item) throw new Error("no item");
    const withItem = (more: object) =>
      hash(signingText({ ...SHEET, effects: { ...SHEET.effects, items: [{ ...item, ...more }] } }));
    const note = (reynolds: number) => ({ ...NOTE, values: { ...NOTE.values, reynolds } });
    const texts = [
      withItem({}),
      withItem({ newNotes: [note(1.03e7)] }),
      withItem({ newNotes: [note(1.04e7)] }),
      withItem({ vanishedNotes: [note(1.03e7)] }),
      withItem({ refusedNow: note(1.03e7) }),
    ];
    expect(new Set(texts).size).toBe(texts.length);
  });
});
