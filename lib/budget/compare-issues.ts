import type { Transaction } from "sequelize";
import type { BudgetResults } from "@/lib/evaluation/budget/results";
import { canonicalLineText } from "@/lib/evaluation/lines/canonical-line-text";
import type { LineState } from "@/lib/evaluation/lines/line-state";
import { lineName, nameBookOf, type NameBook } from "@/lib/evaluation/lines/name-book";
import type { Actor } from "@/lib/vocabulary/actor";
import { LINE_KINDS } from "@/lib/vocabulary/lines";
import { Refusal } from "@/lib/vocabulary/refusal";
import { inSnapshot } from "@/models/database";
import { comparedFields, type LineSide } from "./compared-fields";
import { issueFactsOf } from "./issue-facts";
import { changePatch, type LineTexts } from "./line-diff";
import { loadBudget, type LoadedBudget, type ProductRow } from "./load-budget";
import { namesOf } from "./members";
import { readableProduct } from "./queries";
import type { ComparedLine, IssueComparison, IssueFacts } from "./views";

/** What two issues of a budget differ in, in either direction, read from the issues alone. */
export function compareIssues(actor: Actor, productCode: string, from: number, to: number): Promise<IssueComparison> {
  return inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    const [before, after] = await bothSides(product, from, to, tx);
    const facts = await issueFactsOf(product, tx);
    return {
      from: factsOf(facts, from),
      to: factsOf(facts, to),
      lines: changedPairs(before, after).map(comparedLine),
      items: comparedItems(before, after),
      points: comparedPoints(before.budget.results, after.budget.results),
    };
  });
}

/** The same as a unified patch over the canonical texts of the lines. */
export function issuesPatch(actor: Actor, productCode: string, from: number, to: number): Promise<string> {
  return inSnapshot(async (tx) => {
    const product = await readableProduct(actor, productCode, tx);
    const [before, after] = await bothSides(product, from, to, tx);
    return changePatch(changedPairs(before, after).map(textsOf));
  });
}

interface Side {
  budget: LoadedBudget;
  names: NameBook;
}

/** A line on both sides; one of them may be without it. */
type Pair = { line: LineState } & Record<"was" | "now", LineSide | null>;

async function bothSides(product: ProductRow, from: number, to: number, tx: Transaction): Promise<[Side, Side]> {
  if (from === to) throw new Refusal("invalid", "Compare an issue with another one.");
  const people = new Map((await namesOf(product.id, tx)).map(({ id, name }) => [id, name]));
  const before = await loadBudget(product.id, from, tx);
  const after = await loadBudget(product.id, to, tx);
  return [
    { budget: before, names: nameBookOf(before.state, people) },
    { budget: after, names: nameBookOf(after.state, people) },
  ];
}

function changedPairs(before: Side, after: Side): Pair[] {
  const [were, are] = [sidesOf(before), sidesOf(after)];
  return [...new Set([...are.keys(), ...were.keys()])]
    .flatMap((key): Pair[] => {
      const [was = null, now = null] = [were.get(key), are.get(key)];
      const line = now?.line ?? was?.line;
      return line && was?.line.letter !== now?.line.letter ? [{ line, was, now }] : [];
    })
    .sort((one, other) => LINE_KINDS.indexOf(one.line.kind) - LINE_KINDS.indexOf(other.line.kind));
}

function sidesOf({ budget, names }: Side): Map<string, LineSide> {
  return new Map(budget.state.lines.map((line) => [keyOf(line), { line, names }]));
}

function comparedLine({ line, was, now }: Pair): ComparedLine {
  return {
    kind: line.kind,
    number: line.number,
    name: lineName(line),
    letterWas: was?.line.letter ?? null,
    letterNow: now?.line.letter ?? null,
    retiredWas: was?.line.retired ?? false,
    retiredNow: now?.line.retired ?? false,
    fields: comparedFields(was, now),
  };
}

function textsOf({ line, was, now }: Pair): LineTexts {
  return {
    name: `${line.kind} ${line.number}`,
    letterBefore: was?.line.letter ?? null,
    letterAfter: now?.line.letter ?? null,
    before: was ? canonicalLineText(was.line, was.names) : "",
    after: now ? canonicalLineText(now.line, now.names) : "",
  };
}

function comparedItems(before: Side, after: Side): IssueComparison["items"] {
  const [was, now] = [predictedByPair(before.budget.results), predictedByPair(after.budget.results)];
  const names = new Map(
    [...before.budget.state.lines, ...after.budget.state.lines].map((line) => [keyOf(line), lineName(line)]),
  );
  const shared = before.budget.results.points.filter((point) =>
    after.budget.results.points.some(({ operatingPoint }) => operatingPoint === point.operatingPoint),
  );
  return [...new Map([...was, ...now]).values()]
    .filter(({ operatingPoint }) => shared.some((point) => point.operatingPoint === operatingPoint))
    .flatMap(({ item, operatingPoint }) => {
      const predictedWas = was.get(`${operatingPoint} ${item}`)?.predicted ?? null;
      const predictedNow = now.get(`${operatingPoint} ${item}`)?.predicted ?? null;
      const name = names.get(`item ${item}`) ?? item;
      return predictedWas === predictedNow ? [] : [{ item, name, operatingPoint, predictedWas, predictedNow }];
    });
}

function predictedByPair({ points }: BudgetResults) {
  return new Map(
    points.flatMap(({ operatingPoint, items }) =>
      items.map(({ item, predicted }) => [`${operatingPoint} ${item}`, { item, operatingPoint, predicted }] as const),
    ),
  );
}

function comparedPoints(before: BudgetResults, after: BudgetResults): IssueComparison["points"] {
  const numbers = [...new Set([...after.points, ...before.points].map(({ operatingPoint }) => operatingPoint))];
  return numbers.map((operatingPoint) => {
    const was = before.points.find((point) => point.operatingPoint === operatingPoint);
    const now = after.points.find((point) => point.operatingPoint === operatingPoint);
    return {
      operatingPoint,
      name: now?.name ?? was?.name ?? operatingPoint,
      predictedWas: was?.totals.predicted ?? null,
      predictedNow: now?.totals.predicted ?? null,
    };
  });
}

function keyOf({ kind, number }: LineState): string {
  return `${kind} ${number}`;
}

function factsOf(facts: readonly IssueFacts[], number: number): IssueFacts {
  const found = facts.find((each) => each.number === number);
  if (!found) throw new Refusal("not_found", `There is no issue ${number} of this budget.`);
  return found;
}
