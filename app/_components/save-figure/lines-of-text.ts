export interface TextLine {
  text: string;
  /** px in the window. */
  x: number;
  baseline: number;
  style: CSSStyleDeclaration;
}

/** The words of a text node, line by line as the page breaks them; what a narrow column cuts off ends in "…". */
export function linesOfText(node: Text): TextLine[] {
  const parent = node.parentElement;
  if (!parent) return [];
  const style = getComputedStyle(parent);
  const edge = cutAt(parent);
  const lines: (TextLine & { top: number; isCut: boolean })[] = [];
  for (const { word, rect } of wordsOf(node)) {
    const last = lines.at(-1);
    const isSameLine = last !== undefined && Math.abs(last.top - rect.top) < 2;
    if (isSameLine && last.isCut) continue;
    const isCut = rect.right > edge + 1;
    if (isSameLine) last.text += isCut ? "…" : ` ${word}`;
    else
      lines.push({
        text: word,
        x: rect.left,
        baseline: rect.top + rect.height * ascentPart(style),
        style,
        top: rect.top,
        isCut,
      });
    if (isSameLine && isCut) last.isCut = true;
  }
  return lines.map(({ text, x, baseline }) => ({ text, x, baseline, style }));
}

function wordsOf(node: Text): { word: string; rect: DOMRect }[] {
  const range = document.createRange();
  return [...node.data.matchAll(/[^\s\u2009]+(?:\u2009[^\s\u2009]+)*/gu)].flatMap(({ index, 0: word }) => {
    range.setStart(node, index);
    range.setEnd(node, index + word.length);
    const rect = range.getBoundingClientRect();
    return rect.width > 0 ? [{ word, rect }] : [];
  });
}

/** Where the column that a text stands in cuts it off. */
function cutAt(from: Element): number {
  for (let at: Element | null = from; at !== null && at.tagName !== "FIGURE"; at = at.parentElement) {
    if (getComputedStyle(at).overflowX === "hidden") return at.getBoundingClientRect().right;
  }
  return Infinity;
}

/** How much of a line of this face lies above its baseline. */
function ascentPart(style: CSSStyleDeclaration): number {
  const context = document.createElement("canvas").getContext("2d");
  if (!context) return 0.8;
  context.font = `${style.fontWeight} ${style.fontSize} ${style.fontFamily}`;
  const { fontBoundingBoxAscent: above, fontBoundingBoxDescent: below } = context.measureText("x");
  return above / (above + below);
}
