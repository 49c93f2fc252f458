import { linesOfText, type TextLine } from "./lines-of-text";

const SVG = "http://www.w3.org/2000/svg";
/** Words and posts may stand a little outside of the picture's own box. */
const MARGIN = 12;
/** The face of every sheet by its own name: on the page it goes by names that the build makes up. */
export const PICTURE_FONT = "Commissioner";

/** What style sheets say on the page has to stand in the file itself. */
const INLINED = [
  "fill",
  "fill-opacity",
  "stroke",
  "stroke-width",
  "stroke-dasharray",
  "stroke-linejoin",
  "stroke-opacity",
  "opacity",
  "overflow",
  "paint-order",
  "text-anchor",
  "vector-effect",
  "font-size",
  "font-weight",
] as const;

export interface PictureSvg {
  text: string;
  /** px */
  width: number;
  height: number;
}

/** A picture of the page as one file that stands for itself: its drawings where they lie, its words as text. */
export function pictureSvg(picture: HTMLElement, title: string): PictureSvg {
  const box = picture.getBoundingClientRect();
  const [width, height] = [Math.ceil(box.width) + 2 * MARGIN, Math.ceil(box.height) + 2 * MARGIN];
  const root = element("svg", { width, height, viewBox: `0 0 ${width} ${height}`, role: "img" });
  root.setAttribute("font-family", `${PICTURE_FONT}, system-ui, sans-serif`);
  const name = element("title", {});
  name.textContent = title;
  const ground = element("rect", { width: "100%", height: "100%", fill: groundOf(picture) });
  root.append(name, ground);
  take(picture, root, { x: box.left - MARGIN, y: box.top - MARGIN });
  return { text: new XMLSerializer().serializeToString(root), width, height };
}

interface Origin {
  x: number;
  y: number;
}

function take(from: Element, into: SVGElement, origin: Origin): void {
  if (getComputedStyle(from).display === "none") return;
  if (from instanceof SVGSVGElement) {
    into.append(placedDrawing(from, origin));
    return;
  }
  for (const node of from.childNodes) {
    if (node instanceof Text) into.append(...linesOfText(node).map((line) => placedText(line, origin)));
    else if (node instanceof Element) take(node, into, origin);
  }
}

function placedDrawing(drawing: SVGSVGElement, origin: Origin): Node {
  const copy = drawing.cloneNode(true);
  if (!(copy instanceof SVGElement)) return copy;
  inline(drawing, copy);
  const { left, top, width, height } = drawing.getBoundingClientRect();
  const place = { x: left - origin.x, y: top - origin.y, width, height };
  for (const [attribute, value] of Object.entries(place)) copy.setAttribute(attribute, String(value));
  return copy;
}

/** The copy has the same elements in the same order. */
function inline(original: Element, copy: Element): void {
  const style = getComputedStyle(original);
  for (const property of INLINED) {
    const value = style.getPropertyValue(property);
    if (value !== "") copy.setAttribute(property, value.replaceAll('"', ""));
  }
  copy.removeAttribute("class");
  copy.removeAttribute("aria-hidden");
  [...original.children].forEach((child, at) => {
    const same = copy.children.item(at);
    if (same) inline(child, same);
  });
}

function placedText({ text, x, baseline, style }: TextLine, origin: Origin): SVGElement {
  const words = element("text", {
    ...{ x: x - origin.x, y: baseline - origin.y, fill: style.color },
    ...{ "font-size": style.fontSize, "font-weight": style.fontWeight },
  });
  words.textContent = text;
  return words;
}

/** The colour that the picture lies on. */
function groundOf(picture: Element): string {
  for (let at: Element | null = picture; at !== null; at = at.parentElement) {
    const colour = getComputedStyle(at).backgroundColor;
    if (colour !== "transparent" && colour !== "rgba(0, 0, 0, 0)") return colour;
  }
  return "white";
}

function element(name: string, attributes: Readonly<Record<string, string | number>>): SVGElement {
  const made = document.createElementNS(SVG, name);
  for (const [attribute, value] of Object.entries(attributes)) made.setAttribute(attribute, String(value));
  if (!(made instanceof SVGElement)) throw new Error(`${name} is no element of a drawing.`);
  return made;
}
