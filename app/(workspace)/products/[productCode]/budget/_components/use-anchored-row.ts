import { type RefObject, useEffect } from "react";

interface AnchoredRow {
  keys: readonly string[];
  reveal: (place: number) => void;
  offsetOf: (place: number) => number;
}

/** An address that ends in "#item-1010" leads to that row, also where it does not stand in the document yet. */
export function useAnchoredRow(
  body: RefObject<HTMLTableSectionElement | null>,
  { keys, reveal, offsetOf }: AnchoredRow,
): void {
  useEffect(() => {
    const go = () => {
      const place = keys.indexOf(decodeURIComponent(window.location.hash.slice(1)));
      if (place < 0 || !body.current) return;
      // Rows above it may turn out higher or lower than thought: to where it should be first, then to where it is.
      window.scrollBy({ top: body.current.getBoundingClientRect().top + offsetOf(place) - window.innerHeight / 3 });
      reveal(place);
      body.current.querySelector(`tr[data-place="${place}"]`)?.scrollIntoView({ block: "center" });
    };
    go();
    window.addEventListener("hashchange", go);
    return () => window.removeEventListener("hashchange", go);
  }, [body, keys, reveal, offsetOf]);
}
