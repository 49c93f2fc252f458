import { type Page } from "@playwright/test";

export interface DrawnPart {
  part: string;
  /** Newtons that the part says it stands for. */
  from: number;
  to: number;
  /** Pixels from the picture's left edge at which it is drawn. */
  left: number;
  right: number;
}

export interface DrawnStave {
  width: number;
  /** Newtons at the left and the right edge. */
  min: number;
  max: number;
  parts: DrawnPart[];
  ticks: { at: number; text: string }[];
}

/** What the browser has drawn of the first stave, and what each part says it is. */
export async function drawnStave(page: Page): Promise<DrawnStave> {
  return page
    .locator("svg[data-stave]")
    .first()
    .evaluate((picture) => {
      const frame = picture.getBoundingClientRect();
      const newtons = (element: Element, name: string) => Number(element.getAttribute(`data-${name}`));
      const parts = [...picture.querySelectorAll("[data-part]")].map((element) => {
        const box = element.getBoundingClientRect();
        const isPost = element.hasAttribute("data-at");
        return {
          part: element.getAttribute("data-part") ?? "",
          from: newtons(element, isPost ? "at" : "from"),
          to: newtons(element, isPost ? "at" : "to"),
          left: box.left - frame.left,
          right: box.right - frame.left,
        };
      });
      const ticks = [...picture.querySelectorAll("[data-part=tick]")].map((tick) => ({
        at: newtons(tick, "at"),
        text: tick.parentElement?.querySelector("text")?.textContent ?? "",
      }));
      return {
        width: frame.width,
        min: newtons(picture, "scale-min"),
        max: newtons(picture, "scale-max"),
        parts,
        ticks,
      };
    });
}

/** Parts of the picture that are drawn more than a pixel from where their newtons belong on its straight scale. */
export function misplacedParts({ width, min, max, parts }: DrawnStave): DrawnPart[] {
  const pixelOf = (newtons: number) => ((newtons - min) / (max - min)) * width;
  return parts.filter(
    ({ from, to, left, right }) => Math.abs(left - pixelOf(from)) > 1 || Math.abs(right - pixelOf(to)) > 1,
  );
}
