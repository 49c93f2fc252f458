import { readFileSync } from "node:fs";
import { expect, hydrated, test } from "./support/leeboard-test";

test("a picture is saved as an SVG that parses and as a PNG of twice its size", async ({ page, signIn }) => {
  await signIn(page, "lusia@thistlemere.example");
  await page.goto("/products/TF2/pictures");
  await hydrated(page);
  const figure = page.getByRole("figure").filter({ hasText: "post: allocation" });
  const saved = async (format: string) => {
    const download = page.waitForEvent("download");
    await figure.getByRole("button", { name: `Save as ${format}` }).click();
    return readFileSync(await (await download).path());
  };

  const svg = (await saved("SVG")).toString("utf8");
  const read = await page.evaluate((text) => {
    const { documentElement: root } = new DOMParser().parseFromString(text, "image/svg+xml");
    const sides = [Number(root.getAttribute("width")), Number(root.getAttribute("height"))];
    return { name: root.nodeName, font: root.getAttribute("font-family"), sides, words: root.textContent };
  }, svg);
  expect(read).toMatchObject({ name: "svg", font: expect.stringContaining("Commissioner") });
  expect(read.words).toContain("040 Front and mid panels, inner");

  // Width and height stand in the header of a PNG at byte 16 (ISO/IEC 15948, 11.2.2).
  const png = await saved("PNG");
  expect(png.subarray(1, 4).toString("latin1")).toBe("PNG");
  expect([png.readUInt32BE(16), png.readUInt32BE(20)]).toEqual(read.sides.map((side) => 2 * side));
});
