import type { LoadedBudget } from "@/lib/budget/load-budget";
import { allocationsView, type AllocationLine } from "@/lib/evaluation/budget/allocations-view";
import { toHundredths } from "@/lib/units/rounding";
import type { DaySheetItem } from "../workspace-views";

/**
 * The items that a person owns, each beside its allocation at the reference operating point, and what became of it
 * since an earlier issue.
 */
export function ownItems(
  userId: number,
  productCode: string,
  { state, results }: LoadedBudget,
  then: LoadedBudget | null,
): DaySheetItem[] {
  const { operatingPoint, lines } = allocationsView(state, results);
  return state.lines.flatMap((line) => {
    if (line.kind !== "item" || line.retired || line.body.ownerId !== userId) return [];
    const standing = lines.find(({ kind, number }) => kind === "item" && number === line.number);
    const notes = results.points
      .flatMap(({ items }) => items.filter(({ item }) => item === line.number))
      .flatMap((result) => result.notes);
    const cautions = new Set(notes.filter(({ severity }) => severity === "caution").map(({ code }) => code));
    return [
      {
        ...{ productCode, number: line.number, name: line.body.name, letter: line.letter, operatingPoint },
        predicted: standing?.predicted ?? null,
        allocationHundredths: standing?.allocationHundredths ?? null,
        over: standing?.isOver ?? false,
        cautions: cautions.size,
        since: then && sinceThen(line.number, then, { letter: line.letter, operatingPoint, standing }),
      },
    ];
  });
}

interface Standing {
  letter: string;
  operatingPoint: string;
  standing: AllocationLine | undefined;
}

/** null where nothing of the item moved, to the hundredth of a newton. */
function sinceThen(number: string, then: LoadedBudget, now: Standing): DaySheetItem["since"] {
  const before = then.state.lines.find((line) => line.kind === "item" && line.number === number);
  if (!before) return { letterWas: null, predictedDelta: null, allocationDelta: null };
  const view = allocationsView(then.state, then.results);
  const was = view.lines.find((line) => line.kind === "item" && line.number === number);
  const samePoint = view.operatingPoint === now.operatingPoint;
  const predictedDelta = samePoint ? difference(was?.predicted, now.standing?.predicted) : null;
  const allocationDelta = difference(
    (was?.allocationHundredths ?? 0) / 100,
    (now.standing?.allocationHundredths ?? 0) / 100,
  );
  const hasMoved = [predictedDelta, allocationDelta].some((delta) => delta !== null && toHundredths(delta) !== 0);
  return hasMoved || before.letter !== now.letter
    ? { letterWas: before.letter, predictedDelta, allocationDelta }
    : null;
}

function difference(was: number | null | undefined, now: number | null | undefined): number | null {
  return typeof was === "number" && typeof now === "number" ? now - was : null;
}
