/** A catalogue shape with its published drag coefficient. */
export interface BluffBodyShape {
  /** Shape and source in one word. */
  id: string;
  name: string;
  /** C_D on the reference area [-]. */
  dragCoefficient: number;
  /** Printed rounding and spread between books, relative. */
  spread: number;
  referenceArea: "frontal area" | "panel area";
  source: string;
  /** The value is quoted from memory: check it against the book before it decides anything. */
  isFromMemory: boolean;
  /** A value of a loading code, no measured mean drag. */
  isLoadingCodeValue: boolean;
}

const WHITE_2D = "White, Fluid Mechanics, Table 7.2 (two-dimensional bodies, Re about 1e4 and above)";
const WHITE_3D = "White, Fluid Mechanics, Table 7.3 (three-dimensional bodies, Re about 1e4 and above)";
const HOERNER = "Hoerner, Fluid-Dynamic Drag, 1965, ch. III (summary figure of simple shapes)";
const OLDER_LIST = "older handbook list for rectangular plates (often credited to Rouse; attribution uncertain)";
const EN_1991 = "EN 1991-1-4:2005, 7.4.3 signboards (value of a loading code, no measured mean drag)";

const SOURCE_WORDS: ReadonlyMap<string, string> = new Map([
  [WHITE_2D, "white"],
  [WHITE_3D, "white"],
  [HOERNER, "hoerner"],
  [OLDER_LIST, "older-list"],
  [EN_1991, "en-1991"],
]);

/**
 * Published drag coefficients of simple shapes, above the low-Re range. Books differ: one shape may stand here twice, and
 * the cone of 60° does with 0.80 and 0.50 (its angle convention is uncertain). All values are quoted from memory.
 */
export const BLUFF_BODY_SHAPES: readonly BluffBodyShape[] = [
  shape("rectangular-plate-normal-1", "Rectangular plate, face on, aspect ratio 1", 1.18, 0.03, WHITE_3D),
  shape("rectangular-plate-normal-5", "Rectangular plate, face on, aspect ratio 5", 1.2, 0.03, WHITE_3D),
  shape("rectangular-plate-normal-10", "Rectangular plate, face on, aspect ratio 10", 1.3, 0.03, WHITE_3D),
  shape("rectangular-plate-normal-20", "Rectangular plate, face on, aspect ratio 20", 1.5, 0.03, WHITE_3D),
  shape("rectangular-plate-normal-infinite", "Rectangular plate, face on, aspect ratio infinite", 2, 0.03, WHITE_2D),
  shape("rectangular-plate-normal-1", "Rectangular plate, face on, aspect ratio 1", 1.16, 0.05, OLDER_LIST),
  shape("rectangular-plate-normal-4", "Rectangular plate, face on, aspect ratio 4", 1.17, 0.05, OLDER_LIST),
  shape("rectangular-plate-normal-8", "Rectangular plate, face on, aspect ratio 8", 1.23, 0.05, OLDER_LIST),
  shape("rectangular-plate-normal-12.5", "Rectangular plate, face on, aspect ratio 12.5", 1.34, 0.05, OLDER_LIST),
  shape("rectangular-plate-normal-25", "Rectangular plate, face on, aspect ratio 25", 1.57, 0.05, OLDER_LIST),
  shape("rectangular-plate-normal-50", "Rectangular plate, face on, aspect ratio 50", 1.76, 0.05, OLDER_LIST),
  shape("rectangular-plate-normal-infinite", "Rectangular plate, face on, aspect ratio infinite", 2, 0.05, OLDER_LIST),
  shape("rectangular-plate-normal-infinite", "Rectangular plate, face on, aspect ratio infinite", 1.98, 0.03, HOERNER),
  shape("signboard-force-coefficient", "Signboard, force coefficient of a loading code", 1.8, 0.001, EN_1991),
  shape("disk-normal", "Disk, face on", 1.17, 0.03, WHITE_3D),
  shape("disk-normal", "Disk, face on", 1.17, 0.03, HOERNER),
  shape("cube-face-on", "Cube, face on", 1.07, 0.03, WHITE_3D),
  shape("cube-face-on", "Cube, face on", 1.05, 0.03, HOERNER),
  shape("cube-edge-on-45deg", "Cube, edge on (45°)", 0.81, 0.03, WHITE_3D),
  shape("cube-corner-or-edge-on", "Cube, corner or edge on", 0.8, 0.03, HOERNER),
  shape("sphere-subcritical", "Sphere, below the drag crisis", 0.47, 0.03, WHITE_3D),
  shape("sphere-supercritical", "Sphere, above the drag crisis", 0.2, 0.3, WHITE_3D),
  shape("sphere-subcritical", "Sphere, below the drag crisis", 0.47, 0.03, HOERNER),
  shape(
    "circular-cylinder-2d-subcritical",
    "Long circular cylinder across the stream, below the drag crisis",
    1.2,
    0.03,
    WHITE_2D,
  ),
  shape(
    "circular-cylinder-2d-supercritical",
    "Long circular cylinder across the stream, above the drag crisis",
    0.3,
    0.3,
    WHITE_2D,
  ),
  shape(
    "circular-cylinder-2d-subcritical",
    "Long circular cylinder across the stream, below the drag crisis",
    1.17,
    0.03,
    HOERNER,
  ),
  shape(
    "circular-cylinder-cross-flow-finite-laminar-1",
    "Circular cylinder of finite length across the stream, below the drag crisis, length over diameter 1",
    0.64,
    0.03,
    WHITE_3D,
  ),
  shape(
    "circular-cylinder-cross-flow-finite-laminar-3",
    "Circular cylinder of finite length across the stream, below the drag crisis, length over diameter 3",
    0.72,
    0.03,
    WHITE_3D,
  ),
  shape(
    "circular-cylinder-cross-flow-finite-laminar-5",
    "Circular cylinder of finite length across the stream, below the drag crisis, length over diameter 5",
    0.74,
    0.03,
    WHITE_3D,
  ),
  shape(
    "circular-cylinder-cross-flow-finite-laminar-10",
    "Circular cylinder of finite length across the stream, below the drag crisis, length over diameter 10",
    0.82,
    0.03,
    WHITE_3D,
  ),
  shape(
    "circular-cylinder-cross-flow-finite-laminar-20",
    "Circular cylinder of finite length across the stream, below the drag crisis, length over diameter 20",
    0.91,
    0.03,
    WHITE_3D,
  ),
  shape(
    "circular-cylinder-cross-flow-finite-laminar-40",
    "Circular cylinder of finite length across the stream, below the drag crisis, length over diameter 40",
    0.98,
    0.03,
    WHITE_3D,
  ),
  shape("square-cylinder-2d-face-on", "Long square bar, face on", 2.1, 0.03, WHITE_2D),
  shape("square-cylinder-2d-edge-on", "Long square bar, edge on", 1.6, 0.03, WHITE_2D),
  shape("square-cylinder-2d-face-on", "Long square bar, face on", 2.05, 0.03, HOERNER),
  shape("square-cylinder-2d-edge-on", "Long square bar, edge on", 1.55, 0.03, HOERNER),
  shape("half-tube-2d-open-upstream", "Long half tube, open upstream", 2.3, 0.03, WHITE_2D),
  shape("half-tube-2d-closed-upstream", "Long half tube, closed upstream", 1.2, 0.03, WHITE_2D),
  shape("half-cylinder-2d-round-upstream", "Long half cylinder, round upstream", 1.2, 0.03, WHITE_2D),
  shape("half-cylinder-2d-flat-upstream", "Long half cylinder, flat upstream", 1.7, 0.03, WHITE_2D),
  shape("hemispherical-cup-open-upstream", "Hemispherical cup, open upstream", 1.4, 0.03, WHITE_3D),
  shape("hemispherical-cup-closed-upstream", "Hemispherical cup, closed upstream", 0.4, 0.03, WHITE_3D),
  shape("hemispherical-cup-open-upstream", "Hemispherical cup, open upstream", 1.42, 0.03, HOERNER),
  shape("hemispherical-cup-closed-upstream", "Hemispherical cup, closed upstream", 0.38, 0.03, HOERNER),
  shape(
    "cone-point-upstream-flat-base-10",
    "Cone, point upstream, flat base, full apex angle 10°",
    0.3,
    0.03,
    WHITE_3D,
  ),
  shape(
    "cone-point-upstream-flat-base-20",
    "Cone, point upstream, flat base, full apex angle 20°",
    0.4,
    0.03,
    WHITE_3D,
  ),
  shape(
    "cone-point-upstream-flat-base-30",
    "Cone, point upstream, flat base, full apex angle 30°",
    0.55,
    0.03,
    WHITE_3D,
  ),
  shape(
    "cone-point-upstream-flat-base-60",
    "Cone, point upstream, flat base, full apex angle 60°",
    0.8,
    0.03,
    WHITE_3D,
  ),
  shape(
    "cone-point-upstream-flat-base-90",
    "Cone, point upstream, flat base, full apex angle 90°",
    1.15,
    0.03,
    WHITE_3D,
  ),
  shape(
    "flat-faced-cylinder-axial-flow-0.5",
    "Flat-faced cylinder along the stream, length over diameter 0.5",
    1.15,
    0.03,
    WHITE_3D,
  ),
  shape(
    "flat-faced-cylinder-axial-flow-1",
    "Flat-faced cylinder along the stream, length over diameter 1",
    0.9,
    0.03,
    WHITE_3D,
  ),
  shape(
    "flat-faced-cylinder-axial-flow-2",
    "Flat-faced cylinder along the stream, length over diameter 2",
    0.85,
    0.03,
    WHITE_3D,
  ),
  shape(
    "flat-faced-cylinder-axial-flow-4",
    "Flat-faced cylinder along the stream, length over diameter 4",
    0.87,
    0.03,
    WHITE_3D,
  ),
  shape(
    "flat-faced-cylinder-axial-flow-8",
    "Flat-faced cylinder along the stream, length over diameter 8",
    0.99,
    0.03,
    WHITE_3D,
  ),
  shape("cone-point-upstream-flat-base-60", "Cone, point upstream, flat base, full apex angle 60°", 0.5, 0.03, HOERNER),
];

function shape(id: string, name: string, dragCoefficient: number, spread: number, source: string): BluffBodyShape {
  const isLoadingCodeValue = source === EN_1991;
  return {
    id: `${id}-${SOURCE_WORDS.get(source) ?? "unknown"}`,
    name,
    dragCoefficient,
    spread,
    referenceArea: isLoadingCodeValue ? "panel area" : "frontal area",
    source,
    isFromMemory: true,
    isLoadingCodeValue,
  };
}
