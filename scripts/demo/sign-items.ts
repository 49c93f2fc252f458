import { entered, form, plate, type ItemDraft } from "./item-draft";

export const SIGN_GROUPS = [
  { number: "G10", name: "Panel" },
  { number: "G20", name: "Frame behind" },
  { number: "G30", name: "Attachments" },
] as const;

const FORM_TABLE = "House table of edges and open sections, TH-DT-06";

export const ROUGH_ON_PURPOSE =
  "Taken as fully rough on purpose: drops and runs of the zinc are coarser than its grain, and the line reads high.";

/** Sign panel GS-4, edge on, as it was first booked: the rear face still taken for smooth. */
export const SIGN_ITEMS: readonly ItemDraft[] = [
  {
    number: "010",
    name: "Front face",
    owner: "odo",
    group: "G10",
    grade: "released",
    ...plate({ length: 6, breadth: 2.4, faces: 1, surface: "F40" }),
    allocation: 14.5,
    evidence: ["Drawing GS4-101", "B"],
  },
  {
    number: "020",
    name: "Rear face",
    owner: "odo",
    group: "G10",
    grade: "preliminary",
    ...plate({ length: 6, breadth: 2.4, faces: 1, surface: "F80" }),
    allocation: 15,
    evidence: ["Drawing GS4-102", "A"],
    justify: {
      "roughness-above-admissible": "First booking as a smooth face; the zinc is to be judged before the next issue.",
    },
  },
  {
    number: "030",
    name: "Top and bottom caps",
    owner: "odo",
    group: "G10",
    grade: "released",
    ...plate({ length: 6, breadth: 0.12, faces: 2, surface: "F50" }),
    allocation: 1.5,
    evidence: ["Drawing GS4-103", "A"],
  },
  {
    number: "040",
    name: "Upwind edge, pressure",
    owner: "odo",
    group: "G10",
    grade: "preliminary",
    ...form(0.55, 0.288, FORM_TABLE),
    allocation: 54,
    evidence: ["Drawing GS4-103", "A"],
  },
  {
    number: "050",
    name: "Downwind edge, base",
    owner: "odo",
    group: "G10",
    grade: "preliminary",
    ...form(0.25, 0.288, FORM_TABLE),
    allocation: 25,
    evidence: ["Drawing GS4-103", "A"],
  },
  {
    number: "060",
    name: "Rear stiffeners (5)",
    owner: "tansy",
    group: "G20",
    grade: "layout",
    ...form(1.2, 0.72, FORM_TABLE, [0.4, "Each stands in the wake of the one ahead, from the second on."]),
    allocation: 95,
    evidence: ["Layout GS4-LA-06", "B"],
  },
  {
    number: "070",
    name: "Horizontal rails (3)",
    owner: "tansy",
    group: "G20",
    grade: "layout",
    ...plate({ length: 6, breadth: 0.18, faces: 3, surface: "F80" }, { frictionLine: "fully-rough" }),
    allocation: 4.5,
    evidence: ["Layout GS4-LA-07", "A"],
    justify: { "fully-rough-line-on-smoother-surface": ROUGH_ON_PURPOSE },
  },
  {
    number: "080",
    name: "Clamp brackets (10)",
    owner: "tansy",
    group: "G20",
    grade: "released",
    ...form(1.1, 0.09, FORM_TABLE, [0.5, "They stand between the stiffeners."]),
    allocation: 16,
    evidence: ["Drawing GS4-112", "C"],
  },
  {
    number: "090",
    name: "Luminaire arms (3)",
    owner: "tansy",
    group: "G30",
    grade: "layout",
    ...form(1, 0.105, FORM_TABLE, [0.8, "The second and third stand in a wake in part."]),
    allocation: 26,
    evidence: ["Layout GS4-LA-09", "A"],
  },
  {
    number: "100",
    name: "Conduit and junction box",
    owner: "tansy",
    group: "G30",
    grade: "estimated",
    ...form(1.05, 0.06, FORM_TABLE, [0.6, "Half of it stands behind the chord."]),
    allocation: 10,
  },
  {
    number: "110",
    name: "Interference of panel and chord",
    owner: "tansy",
    group: "G30",
    grade: "estimated",
    ...entered(0.03582, "Judgement of the aerodynamics group, note TH-AN-40"),
    allocation: 12,
  },
];
