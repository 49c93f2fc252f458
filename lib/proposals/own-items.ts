import type { LoadedBudget } from "@/lib/budget/load-budget";
import { allocationsView } from "@/lib/evaluation/budget/allocations-view";
import type { DaySheetItem } from "./workspace-views";

/** The items that a person owns, each beside its allocation at the reference operating point. */
export function ownItems(userId: number, productCode: string, { state, results }: LoadedBudget): DaySheetItem[] {
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
      },
    ];
  });
}
