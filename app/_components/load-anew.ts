import type { Route } from "next";

/** Goes to a page by loading it whole: nothing that was read for the session before stays in the window. */
export function loadAnew(page: Route): void {
  window.location.href = page;
}
