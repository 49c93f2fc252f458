import { FRICTION_LINES, FRICTION_LINES_BY_INTEGRAL, type FrictionLines } from "@/lib/aero/friction/friction-lines";

/** The lines by the version of flat-plate friction and duct entry: both took the second set of constants at once. */
const LINES_OF_VERSIONS: ReadonlyMap<number, FrictionLines> = new Map([
  [1, FRICTION_LINES],
  [2, FRICTION_LINES_BY_INTEGRAL],
]);

/** @throws RangeError for a version that nobody published */
export function frictionLinesOf(version: number): FrictionLines {
  const lines = LINES_OF_VERSIONS.get(version);
  if (!lines) throw new RangeError(`no friction lines of version ${version}`);
  return lines;
}
