import { type RefObject, useCallback, useEffect, useLayoutEffect, useRef, useState } from "react";
import { flushSync } from "react-dom";

import { firstWindow, isSameWindow, MOST_ROWS, type RowWindow, rowWindow, topOf } from "./row-window";

interface LongList {
  /** Of every row whose content is known, in order; the content of those after them is on its way. */
  keys: readonly string[];
  count: number;
}

interface WindowedRows {
  /** Of the part of the table that holds the rows. */
  body: RefObject<HTMLTableSectionElement | null>;
  window: RowWindow;
  /** Brings a row into the document, so that it can be given the focus. */
  reveal: (place: number) => void;
  /** px from the top of the first row to that of a row, seen or not. */
  offsetOf: (place: number) => number;
}

/**
 * Of a long list only the rows in view stand in the document, with the row that has the focus; a short one stands whole,
 * and so does a long one while it is printed.
 */
export function useRowWindow({ keys, count }: LongList): WindowedRows {
  const body = useRef<HTMLTableSectionElement>(null);
  const known = keys.length;
  const heights = useRef(new Map<string, number>());
  const focused = useRef<string | null>(null);
  const [window_, setWindow] = useState<RowWindow>(() => firstWindow(count, known));
  const [isPrinting, setPrinting] = useState(false);

  const view = useCallback(
    (kept: readonly number[]) => {
      const rect = body.current?.getBoundingClientRect();
      const top = -(rect?.top ?? 0);
      const heightOf = (place: number) => heights.current.get(keys[place] ?? "");
      return { count, known: keys.length, heightOf, top, bottom: top + window.innerHeight, kept };
    },
    [keys, count],
  );

  const update = useCallback(() => {
    if (count <= MOST_ROWS) return;
    measure(body.current, heights.current);
    const kept = focused.current === null ? [] : [keys.indexOf(focused.current)];
    const next = rowWindow(view(kept));
    setWindow((current) => (isSameWindow(current, next) ? current : next));
  }, [keys, count, view]);

  useLayoutEffect(update, [update]);
  useViewChanges(update);
  usePrinting(setPrinting);
  useFocusedRow(body, focused);

  const reveal = useCallback(
    (place: number) => {
      focused.current = keys[place] ?? null;
      if (count > MOST_ROWS) flushSync(() => setWindow(rowWindow(view([place]))));
    },
    [keys, count, view],
  );
  const offsetOf = useCallback((place: number) => topOf(place, view([])), [view]);

  const isWhole = isPrinting || count <= MOST_ROWS;
  return { body, window: isWhole ? firstWindow(known, known) : window_, reveal, offsetOf };
}

function measure(body: HTMLTableSectionElement | null, heights: Map<string, number>): void {
  for (const row of body?.querySelectorAll<HTMLTableRowElement>("tr[data-row]") ?? []) {
    heights.set(row.dataset.row ?? "", row.getBoundingClientRect().height);
  }
}

function useViewChanges(update: () => void): void {
  useEffect(() => {
    let asked = 0;
    const later = () => {
      cancelAnimationFrame(asked);
      asked = requestAnimationFrame(update);
    };
    window.addEventListener("scroll", later, { passive: true });
    window.addEventListener("resize", later);
    return () => {
      cancelAnimationFrame(asked);
      window.removeEventListener("scroll", later);
      window.removeEventListener("resize", later);
    };
  }, [update]);
}

/** Paper shows every row: the list is whole before the browser takes its picture. */
function usePrinting(setPrinting: (isPrinting: boolean) => void): void {
  useEffect(() => {
    const before = () => flushSync(() => setPrinting(true));
    const after = () => setPrinting(false);
    window.addEventListener("beforeprint", before);
    window.addEventListener("afterprint", after);
    return () => {
      window.removeEventListener("beforeprint", before);
      window.removeEventListener("afterprint", after);
    };
  }, [setPrinting]);
}

/** A row that left the document would take the focus with it. */
function useFocusedRow(body: RefObject<HTMLTableSectionElement | null>, focused: RefObject<string | null>): void {
  useEffect(() => {
    const section = body.current;
    const follow = ({ target }: FocusEvent) => {
      const row = target instanceof Element ? target.closest<HTMLElement>("tr[data-row]") : null;
      focused.current = row?.dataset.row ?? null;
    };
    section?.addEventListener("focusin", follow);
    return () => section?.removeEventListener("focusin", follow);
  }, [body, focused]);
}
