const LONGEST_BODY = 1_048_576;
const READING = new Set(["GET", "HEAD", "OPTIONS"]);

/** A write that a browser sent from another site. Programs that are no browser send neither header. */
export function isForeignWrite(request: Request): boolean {
  if (READING.has(request.method)) return false;

  const site = request.headers.get("sec-fetch-site");
  if (site && site !== "same-origin" && site !== "none") return true;

  const origin = request.headers.get("origin");
  if (origin === null) return false;

  return hostOf(origin) !== request.headers.get("host");
}

/** A read that another site's page made the browser do. */
export function isForeignRead(request: Request): boolean {
  const site = request.headers.get("sec-fetch-site");

  return site !== null && site !== "same-origin" && site !== "none";
}

/** A body that says it is longer than anything a page of ours sends, or does not say how long it is. */
export function bodyTooLong(request: Request): boolean {
  if (READING.has(request.method)) return false;
  const length = request.headers.get("content-length");
  if (length === null) return request.headers.has("transfer-encoding");

  return !/^\d+$/.test(length) || Number(length) > LONGEST_BODY;
}

function hostOf(origin: string): string | null {
  return URL.canParse(origin) ? new URL(origin).host : null;
}
