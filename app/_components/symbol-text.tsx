/** A symbol as it is printed: what follows "_" stands below the line. */
export function SymbolText({ symbol }: { symbol: string }) {
  const parts = symbol.split(/(_[A-Za-z0-9\u0370-\u03ff]+)/);
  return parts.map((part, at) => (part.startsWith("_") ? <sub key={at}>{part.slice(1)}</sub> : part));
}
