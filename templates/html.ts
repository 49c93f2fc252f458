/** A piece of HTML that is safe to put into another. Only `html` makes one. */
export class SafeHtml {
  constructor(readonly text: string) {}
}

type Piece = string | number | SafeHtml | readonly SafeHtml[];

/** Tag for HTML texts: what is put in is escaped, unless this tag made it. */
export function html(parts: TemplateStringsArray, ...pieces: readonly Piece[]): SafeHtml {
  const text = parts.reduce((all, part, index) => {
    const piece = pieces[index - 1];
    return all + (piece === undefined ? "" : textOf(piece)) + part;
  });
  return new SafeHtml(text);
}

function textOf(piece: Piece): string {
  if (piece instanceof SafeHtml) return piece.text;
  if (typeof piece === "string" || typeof piece === "number") return escapeHtml(String(piece));
  return piece.map(({ text }) => text).join("\n");
}

function escapeHtml(text: string): string {
  return text
    .replaceAll("&", "&amp;")
    .replaceAll("<", "&lt;")
    .replaceAll(">", "&gt;")
    .replaceAll('"', "&quot;")
    .replaceAll("'", "&#39;");
}
