"use client";

import { useSyncExternalStore } from "react";

/** False in the server's HTML and until the page has come alive, then true. */
export function useHydrated(): boolean {
  return useSyncExternalStore(
    () => () => undefined,
    () => true,
    () => false,
  );
}
