import { ALLOCATIONS_NUMBER } from "@/lib/evaluation/lines/allocations-body";
import type { LineContent, LineState } from "@/lib/evaluation/lines/line-state";
import type { OperatingPointBody } from "@/lib/evaluation/lines/operating-point-body";
import { parseBody, type ParsedBody } from "@/lib/evaluation/lines/parse-body";
import { TERMS_NUMBER, type TermsBody } from "@/lib/evaluation/lines/terms-body";
import type { ProductKind } from "@/lib/vocabulary/lines";
import { Refusal, type FieldFault } from "@/lib/vocabulary/refusal";
import { FINISH_CATALOGUE } from "./finish-catalogue";
import type { EstablishProductInput } from "./schema";

const FIRST_LETTER = "–";

/**
 * The lines of issue 1: the reference operating point with its limit, the terms, the allocations sheet without rows
 * (what the reserve leaves of the limit is unallocated) and the catalogue's finishes.
 */
export function firstIssueLines(kind: ProductKind, input: EstablishProductInput): LineState[] {
  const { number } = input.operatingPoint;
  const { point, terms } = parsedBodies(input);
  const faults = [...pointFaults(point), ...termsFaults(kind, number, terms)];
  const limit = point.limitHundredths ?? 0;
  const reserve = terms.reserves.find((row) => row.operatingPoint === number)?.hundredths ?? 0;
  if (faults.length === 0 && reserve > limit) {
    faults.push({ path: "terms.reserves", sentence: "The reserve is part of the limit: it cannot be more." });
  }
  if (faults.length > 0) throw notLikeThis(faults);
  return [
    first(number, { kind: "operating_point", body: point }),
    first(TERMS_NUMBER, { kind: "terms", body: terms }),
    first(ALLOCATIONS_NUMBER, { kind: "allocations", body: { rows: [], unallocatedHundredths: limit - reserve } }),
    ...FINISH_CATALOGUE.map((finish) => first(finish.number, { kind: "finish", body: finish.body })),
  ];
}

function pointFaults({ limitHundredths }: OperatingPointBody): FieldFault[] {
  if (limitHundredths !== null) return [];
  return [{ path: "operatingPoint.body.limitHundredths", sentence: "The reference operating point needs a limit." }];
}

function termsFaults(kind: ProductKind, number: string, terms: TermsBody): FieldFault[] {
  const faults: FieldFault[] = [];
  if (terms.referenceOperatingPoint !== number) {
    const sentence = `The reference operating point is ${number}: there is no other yet.`;
    faults.push({ path: "terms.referenceOperatingPoint", sentence });
  }
  if (terms.reserves.some((row) => row.operatingPoint !== number)) {
    faults.push({ path: "terms.reserves", sentence: `Only ${number} can have a reserve yet.` });
  }
  if (kind === "duct" && terms.flowArea === null) {
    faults.push({ path: "terms.flowArea", sentence: "A duct needs its flow area, so that pascals add up." });
  }
  return faults;
}

function first(number: string, content: LineContent): LineState {
  return { number, letter: FIRST_LETTER, issue: 1, retired: false, ...content };
}

/** Both bodies, or every fault of both at its own field. */
function parsedBodies({ operatingPoint, terms }: EstablishProductInput): {
  point: OperatingPointBody;
  terms: TermsBody;
} {
  const parsedPoint = parseBody("operating_point", operatingPoint.body);
  const parsedTerms = parseBody("terms", terms);
  const faults = [...faultsAt("operatingPoint.body", parsedPoint), ...faultsAt("terms", parsedTerms)];
  if (faults.length > 0 || !parsedPoint.ok || !parsedTerms.ok) throw notLikeThis(faults);
  if (parsedPoint.content.kind !== "operating_point" || parsedTerms.content.kind !== "terms") {
    throw new TypeError("A body was parsed as another kind than the one asked for.");
  }
  return { point: parsedPoint.content.body, terms: parsedTerms.content.body };
}

function faultsAt(path: string, parsed: ParsedBody): FieldFault[] {
  return parsed.ok ? [] : parsed.faults.map((fault) => ({ ...fault, path: `${path}.${fault.path}` }));
}

function notLikeThis(faults: FieldFault[]): Refusal {
  return new Refusal("invalid", "The budget cannot be established like this: see the fields.", faults);
}
