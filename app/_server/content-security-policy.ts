/** The policy of one answer. Scripts and style sheets need the nonce; style attributes are ours and the editor's. */
export function contentSecurityPolicy(nonce: string, inDevelopment: boolean): string {
  const policy = {
    "default-src": "'self'",
    // React rebuilds server stacks with eval while developing, never in a build.
    "script-src": `'self' 'nonce-${nonce}' 'strict-dynamic'${inDevelopment ? " 'unsafe-eval'" : ""}`,
    // The development server puts its style elements in without a nonce.
    "style-src-elem": inDevelopment ? "'self' 'unsafe-inline'" : `'self' 'nonce-${nonce}'`,
    "style-src-attr": "'unsafe-inline'",
    "img-src": "'self' data:",
    "font-src": "'self'",
    "connect-src": "'self'",
    "object-src": "'none'",
    "base-uri": "'none'",
    "form-action": "'self'",
    "frame-ancestors": "'none'",
  };

  return Object.entries(policy)
    .map(([directive, value]) => `${directive} ${value}`)
    .join("; ");
}
