import { newOperatingPoint } from "@/lib/evaluation/lines/operating-point-body";
import { newTerms } from "@/lib/evaluation/lines/terms-body";
import type { CreateProductInput, EstablishProductInput } from "@/lib/products/schema";
import { degreesCelsius, metresPerSecond, squareMetres } from "./item-draft";

export interface DemoProduct {
  product: CreateProductInput;
  /** How many days before the filling it is made and established. */
  firstDay: number;
  operatingPoint: EstablishProductInput["operatingPoint"]["body"];
  terms: EstablishProductInput["terms"];
}

const TIME_ZONE = "Europe/Amsterdam";

function firstPoint(name: string, speed: number, celsius: number, limitNewtons: number, hoursPerYear: number | null) {
  return {
    ...newOperatingPoint(),
    name,
    speed: metresPerSecond(speed),
    staticTemperature: degreesCelsius(celsius),
    hoursPerYear,
    limitHundredths: limitNewtons * 100,
  };
}

function firstTerms(reserveNewtons: number, areas: { referenceArea?: number; flowArea?: number }) {
  const terms = newTerms({ referenceOperatingPoint: "OP-1", reserveHundredths: reserveNewtons * 100 });
  return {
    ...terms,
    timeZone: TIME_ZONE,
    referenceArea: areas.referenceArea === undefined ? null : squareMetres(areas.referenceArea),
    flowArea: areas.flowArea === undefined ? null : squareMetres(areas.flowArea),
  };
}

export const FAIRING: DemoProduct = {
  product: {
    code: "TF2",
    name: "Side fairing TF-2, refrigerated semi-trailer",
    kind: "vehicle_fairing",
    timeZone: TIME_ZONE,
  },
  firstDay: 166,
  operatingPoint: firstPoint("Motorway, 90 km/h, 15 °C, no yaw", 24, 15, 66, 2600),
  terms: firstTerms(3, { referenceArea: 10 }),
};

export const DUCT: DemoProduct = {
  product: { code: "PD7", name: "Supply duct PD-7, paint-drying hall", kind: "duct", timeZone: TIME_ZONE },
  firstDay: 150,
  operatingPoint: firstPoint("Drying, 8.0 m/s bulk, 40 °C", 8, 35, 180, 4200),
  terms: firstTerms(12, { flowArea: 3 }),
};

export const SIGN: DemoProduct = {
  product: { code: "GS4", name: "Motorway gantry sign panel GS-4, edge on", kind: "sign_panel", timeZone: TIME_ZONE },
  firstDay: 132,
  operatingPoint: firstPoint("Service wind along the panel", 20, 10, 290, null),
  terms: firstTerms(16.5, {}),
};
