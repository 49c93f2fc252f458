import type { FrictionLineName } from "@/lib/aero/friction/friction-line-name";
import type { MethodName } from "./method-name";

/** A relative standard uncertainty that a formula brings by itself, and whence it is taken. */
export interface OwnUncertainty {
  relative: number;
  source: string;
}

type Fluid = "air" | "fresh-water" | "sea-water" | "custom";

/** The one table of what lines, methods and fluids are uncertain by, beside their inputs. */
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

/** Of the fluids' formulas. Far below the lines' and not combined; what is given for the state itself is. */
export const FLUID_UNCERTAINTIES: Record<Fluid, { density: OwnUncertainty; dynamicViscosity: OwnUncertainty }> = {
  air: {
    density: { relative: 0.003, source: "judgement: dry air for moist air, up to 0.5 %" },
    dynamicViscosity: { relative: 0.005, source: "judgement: printed sets of constants and tables" },
  },
  "fresh-water": {
    density: { relative: 1e-5, source: "IAPWS SR6-08, rounded up for dissolved air" },
    dynamicViscosity: { relative: 0.01, source: "IAPWS SR6-08" },
  },
  "sea-water": {
    density: { relative: 4e-6, source: "EOS-80, standard deviation at salinity 35" },
    dynamicViscosity: { relative: 0.015, source: "Sharqawy et al. 2010" },
  },
  custom: {
    density: { relative: 0, source: "as given" },
    dynamicViscosity: { relative: 0, source: "as given" },
  },
};
