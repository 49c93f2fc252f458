import type { Route } from "next";

/** An address of this application to go on to; anything that could lead elsewhere becomes the day sheet. */
export function ownPath(wanted: unknown): Route {
  if (typeof wanted !== "string" || !/^\/(?![/\\])[^\\\s]*$/.test(wanted)) return "/";
  if (wanted.startsWith("/sign-in") || wanted.startsWith("/api/")) return "/";

  return wanted as Route;
}
