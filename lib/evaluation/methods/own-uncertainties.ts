import type { FrictionLineName } from "@/lib/aero/friction/friction-line-name";
import type { MethodName } from "./method-name";

/** A relative standard uncertainty that a formula brings by itself, and whence it is taken. */
export interface OwnUncertainty {
  relative: number;
  source: string;
}

/**
 * The one table of what lines and methods are uncertain by, beside their inputs. The fluids' formulas state theirs where
 * they stand: they lie far below the lines' and are not combined.
 */
export const OWN_UNCERTAINTIES: Record<FrictionLineName | "blasius" | MethodName, OwnUncertainty> = {
  blasius: { relative: 0.02, source: "judgement: exact for the ideal plate, pressure gradient and edge beside it" },
  "one-fifth-law": {
    relative: 0.05,
    source: "judgement: printed constants 0.072 and 0.074, and the logarithmic lines",
  },
  "one-seventh-law": {
    relative: 0.05,
    source: "judgement: printed constants 0.031 and 0.0315, and the logarithmic lines",
  },
  "prandtl-schlichting": { relative: 0.04, source: "judgement: spread of the lines from Re 1e6 to 1e9" },
  "schultz-grunow": { relative: 0.05, source: "judgement: up to 7.6 % from the other lines at Re 1e9" },
  white: { relative: 0.05, source: "judgement: mean against the integral of its local form, 4.4 % at Re 1e7" },
  "karman-schoenherr": { relative: 0.04, source: "judgement: spread of the lines from Re 1e6 to 1e9" },
  "ittc-1957": { relative: 0.05, source: "judgement: a model-ship correlation, high at low Re" },
  "momentum-integral": { relative: 0.04, source: "agreement with four lines from Re 1e7 to 1e9; judgement below" },
  "fully-rough": { relative: 0.1, source: "judgement: 8 to 22 % above Mills & Hang" },
  "fully-rough-mills-hang": { relative: 0.1, source: "judgement: 8 to 22 % below Schlichting" },
  "flat-plate-friction": { relative: 0, source: "its friction line's" },
  "duct-entry": { relative: 0.05, source: "judgement: single pass at the entry speed, beside its friction line's" },
  "loss-coefficient": { relative: 0.05, source: "judgement: the setting of a loss beside its source's own scatter" },
  "bluff-body": { relative: 0.05, source: "judgement: printed coefficients of one shape differ by 3 % and more" },
  "drag-area": { relative: 0.03, source: "judgement: carried over to another speed" },
  measured: { relative: 0.02, source: "judgement: carried over by dynamic pressure alone" },
  fixed: { relative: 0, source: "judgement: the force is given, with what uncertainty it has" },
  share: { relative: 0.2, source: "judgement: shares for gaps and interference scatter so" },
};
