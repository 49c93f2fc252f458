/** What every answer carries, with the policy of its content. */
export function securityHeaders(policy: string): Record<string, string> {
  return {
    "content-security-policy": policy,
    // "no-referrer" would make a browser send "Origin: null" with forms, which are then refused.
    "referrer-policy": "same-origin",
    "x-content-type-options": "nosniff",
    "x-frame-options": "DENY",
    "cross-origin-opener-policy": "same-origin",
    "permissions-policy": "camera=(), microphone=(), geolocation=()",
  };
}

/** For answers that are no page: nothing in them loads or runs, wherever they are opened. */
export const NO_CONTENT_POLICY = "default-src 'none'; frame-ancestors 'none'";

/** For what people added: whatever is in it runs nothing, even where a browser shows it. */
export const DOWNLOAD_POLICY = `sandbox; ${NO_CONTENT_POLICY}`;

/** Whether an address is one from which a file is downloaded. */
export function isDownload(path: string): boolean {
  return /^\/api\/products\/[^/]+\/files\/[^/]+$/.test(path);
}
