import { PICTURE_FONT, type PictureSvg } from "./picture-svg";

/** Pixels for each px of the page, so that print and slides stay sharp. */
const SCALE = 2;

/** The picture as pixels. A drawing that is shown as an image reaches no font of the page: it carries its own. */
export async function picturePng({ text, width, height }: PictureSvg): Promise<Blob> {
  const carrying = text.replace("<rect ", `<style>${await fontFaces()}</style><rect `);
  const image = new Image();
  image.src = `data:image/svg+xml;charset=utf-8,${encodeURIComponent(carrying)}`;
  await image.decode();
  const canvas = document.createElement("canvas");
  canvas.width = width * SCALE;
  canvas.height = height * SCALE;
  const context = canvas.getContext("2d");
  if (!context) throw new Error("This browser draws no pixels.");
  context.drawImage(image, 0, 0, canvas.width, canvas.height);
  return new Promise((resolve, reject) =>
    canvas.toBlob((blob) => (blob ? resolve(blob) : reject(new Error("This browser makes no PNG.")))),
  );
}

/** The faces that the page has loaded, with their bytes, under the name that the drawing asks for. */
async function fontFaces(): Promise<string> {
  const loaded = new Set(
    [...document.fonts].filter(({ status }) => status === "loaded").map(({ family }) => bare(family)),
  );
  const used = getComputedStyle(document.body).fontFamily.split(",").map(bare);
  const rules = [...document.styleSheets]
    .flatMap((sheet) => [...sheet.cssRules])
    .filter((rule) => rule instanceof CSSFontFaceRule)
    .filter(({ style }) => {
      const family = bare(style.getPropertyValue("font-family"));
      return loaded.has(family) && used.includes(family);
    });
  return (await Promise.all(rules.map(carriedFace))).join("");
}

async function carriedFace({ style, parentStyleSheet }: CSSFontFaceRule): Promise<string> {
  const [, address] = /url\("?([^")]+)"?\)/.exec(style.getPropertyValue("src")) ?? [];
  if (address === undefined) return "";
  const url = new URL(address, parentStyleSheet?.href ?? document.baseURI);
  const bytes = new Uint8Array(await (await fetch(url)).arrayBuffer());
  const base64 = btoa(Array.from(bytes, (byte) => String.fromCharCode(byte)).join(""));
  const range = style.getPropertyValue("unicode-range");
  return (
    `@font-face{font-family:${PICTURE_FONT};font-weight:100 900;${range ? `unicode-range:${range};` : ""}` +
    `src:url(data:font/woff2;base64,${base64}) format("woff2")}`
  );
}

function bare(family: string): string {
  return family.trim().replaceAll(/["']/g, "");
}
