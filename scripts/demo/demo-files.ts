import { createHash } from "node:crypto";
import { writtenCsv, writtenPdf } from "./written-files";

export interface DemoFile {
  name: string;
  content: Buffer;
}

/** Papers of a firm that does not exist, about parts that were never made. */
const INVENTED = "Invented for the demo of Leeboard. Thistlemere Carriage Works does not exist.";

export const BRACKET_DRAWING: DemoFile = {
  name: "drawing 7731-C.pdf",
  content: writtenPdf([
    "Thistlemere Carriage Works - drawing 7731, revision C",
    "Under-floor brackets: 18 off, stiffened; 4 of revision B fall away",
    "Frontal area of all brackets 0.027 m2",
    INVENTED,
  ]),
};

export const TRIM_DRAWING: DemoFile = {
  name: "drawing 7741-A.pdf",
  content: writtenPdf([
    "Thistlemere Carriage Works - drawing 7741, revision A",
    "Wheel-aperture trim, radius 18 mm from serial 041 on",
    INVENTED,
  ]),
};

export const TRIM_READINGS: DemoFile = {
  name: "mould M-7741 readings.csv",
  content: writtenCsv([
    ["place", "radius mm", "gauge"],
    ["left front", 18.1, "R-22"],
    ["left rear", 17.9, "R-22"],
    ["right front", 18.0, "R-22"],
    ["right rear", 18.2, "R-22"],
  ]),
};

/** A file as a citation names it. */
export function cited({ name, content }: DemoFile) {
  return { name, sha256: createHash("sha256").update(content).digest("hex") };
}
