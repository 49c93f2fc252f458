import type { FrictionLine } from "./friction-line";
import type { FrictionLineName } from "./friction-line-name";
import { FULLY_ROUGH } from "./fully-rough";
import { FULLY_ROUGH_MILLS_HANG } from "./fully-rough-mills-hang";
import { ITTC_1957 } from "./ittc-1957";
import { KARMAN_SCHOENHERR } from "./karman-schoenherr";
import { MOMENTUM_INTEGRAL } from "./momentum-integral";
import { ONE_FIFTH_LAW, ONE_FIFTH_LAW_BY_INTEGRAL } from "./one-fifth-law";
import { ONE_SEVENTH_LAW } from "./one-seventh-law";
import { PRANDTL_SCHLICHTING } from "./prandtl-schlichting";
import { SCHULTZ_GRUNOW } from "./schultz-grunow";
import { WHITE } from "./white";

export type FrictionLines = Readonly<Record<FrictionLineName, FrictionLine>>;

/** Every friction line by its name: a new line is its file, its name and its row here. */
export const FRICTION_LINES: FrictionLines = {
  "one-fifth-law": ONE_FIFTH_LAW,
  "one-seventh-law": ONE_SEVENTH_LAW,
  "prandtl-schlichting": PRANDTL_SCHLICHTING,
  "schultz-grunow": SCHULTZ_GRUNOW,
  white: WHITE,
  "karman-schoenherr": KARMAN_SCHOENHERR,
  "ittc-1957": ITTC_1957,
  "momentum-integral": MOMENTUM_INTEGRAL,
  "fully-rough": FULLY_ROUGH,
  "fully-rough-mills-hang": FULLY_ROUGH_MILLS_HANG,
};

/** The second set of constants: the one-fifth law by the momentum integral, all other lines as in the first. */
export const FRICTION_LINES_BY_INTEGRAL: FrictionLines = {
  ...FRICTION_LINES,
  "one-fifth-law": ONE_FIFTH_LAW_BY_INTEGRAL,
};
