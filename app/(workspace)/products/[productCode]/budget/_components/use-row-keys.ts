import { type KeyboardEvent, type RefObject, useCallback } from "react";

interface RowKeys {
  count: number;
  reveal: (place: number) => void;
}

const CONTROLS = "a[href], button";

/**
 * From the control that has the focus to the same one of another row. Only while the focus is on a control of a row: a
 * screen reader that reads line by line keeps its arrows to itself, and the page scrolls as everywhere.
 */
export function useRowKeys(body: RefObject<HTMLTableSectionElement | null>, { count, reveal }: RowKeys) {
  return useCallback(
    (event: KeyboardEvent<HTMLTableSectionElement>) => {
      const row = event.target instanceof Element ? event.target.closest<HTMLElement>("tr[data-place]") : null;
      if (!row || event.altKey || event.metaKey || event.shiftKey) return;
      const next = placeAfter(event.key, event.ctrlKey, Number(row.dataset.place), count);
      if (next === null) return;

      event.preventDefault();
      const column = event.target instanceof Element ? columnOf(row, event.target) : 0;
      reveal(next);
      const found = body.current?.querySelector(`tr[data-place="${next}"]`);
      const controls = [...(found?.querySelectorAll<HTMLElement>(CONTROLS) ?? [])];
      (controls[column] ?? controls.at(-1))?.focus();
    },
    [body, count, reveal],
  );
}

function placeAfter(key: string, isCtrl: boolean, place: number, count: number): number | null {
  if (isCtrl) return key === "Home" ? 0 : key === "End" ? count - 1 : null;
  if (key === "ArrowDown") return Math.min(place + 1, count - 1);
  return key === "ArrowUp" ? Math.max(place - 1, 0) : null;
}

function columnOf(row: Element, control: Element): number {
  return Math.max(0, [...row.querySelectorAll(CONTROLS)].indexOf(control));
}
