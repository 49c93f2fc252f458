import type { FinishBody } from "@/lib/evaluation/lines/finish-body";

interface CatalogueFinish {
  number: string;
  body: FinishBody;
}

const REPLACE = "Replace it by a measured value where it decides.";

function finish(number: string, name: string, micrometres: number, source: string): CatalogueFinish {
  const roughness = { value: micrometres * 1e-6, entered: `${micrometres} µm` };
  return { number, body: { name, roughness, source: `${source} ${REPLACE}` } };
}

/**
 * The finishes that every product starts from: equivalent sand-grain roughness k_s as drag and duct practice has it.
 * Where only a range is in use its upper end stands here, and surfaces whose range is too wide are left out.
 */
export const FINISH_CATALOGUE: readonly CatalogueFinish[] = [
  finish("F10", "Polished metal or wood, moulded composite", 2, "Common practice, 0.5 to 2 µm, from memory."),
  finish("F20", "Production sheet metal", 4, "Common practice, rivets and laps booked apart, from memory."),
  finish("F30", "Smooth paint, carefully applied", 6, "Common practice, from memory."),
  finish("F40", "Retroreflective sheeting", 10, "Judgement, 5 to 10 µm; edges of letters are steps, booked apart."),
  finish("F50", "Powder coat", 20, "Judgement, 10 to 30 µm by its orange peel."),
  finish("F60", "Paint, mass spray", 30, "Common practice, from memory."),
  finish("F70", "Galvanised duct with joints", 90, "General duct tables, average class, 50 to 150 µm."),
  finish("F80", "Dip-galvanised sheet", 150, "Common practice, also in general duct tables, from memory."),
  finish("F90", "As-cast iron", 250, "Common practice, from memory."),
  finish("F100", "Lined duct, fibrous facing", 900, "General duct tables, about 900 µm and up; trips any laminar run."),
];
