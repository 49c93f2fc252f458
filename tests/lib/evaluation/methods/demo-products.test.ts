import { describe, expect, it } from "vitest";
import { answerOf } from "./evaluate-one";

/** The demo products’ tables, printed to 0.01 N by a hand calculation with ν and q rounded to four digits. */
const sea = 101325;
const FAIRING = { fluid: "air", staticTemperature: 288.15, staticPressure: sea, speed: 25 };
const DUCT = { fluid: "air", staticTemperature: 313.15, staticPressure: sea, speed: 8 };
const SIGN = { fluid: "air", staticTemperature: 278.15, staticPressure: sea, speed: 22 };

const plate = (length: number, breadth: number, faces: number, fields: object) => ({
  method: "flat-plate-friction",
  length,
  breadth,
  faces,
  ...fields,
});
const oneFifth = { frictionLine: "one-fifth-law", transition: { kind: "tripped", at: 0 } };
const laminar = { transition: { kind: "laminar" } };
const mixed = { frictionLine: "one-fifth-law", transition: { kind: "natural", criticalReynolds: 5e5 } };
const rough = { frictionLine: "fully-rough", transition: { kind: "tripped", at: 0 }, roughness: 150e-6 };
const body = (dragCoefficient: number, referenceArea: number, shelterFactor = 1) => ({
  method: "bluff-body",
  dragCoefficient,
  referenceArea,
  shelterFactor,
});
const loss = (lossCoefficient: number) => ({ method: "loss-coefficient", lossCoefficient, flowArea: 3 });

const PRINTED: [string, object, object, number][] = [
  ["TF-2 010", FAIRING, plate(2.4, 0.95, 2, oneFifth), 6.14],
  ["TF-2 020", FAIRING, plate(3.6, 0.95, 2, oneFifth), 8.5],
  ["TF-2 030", FAIRING, plate(1.5, 0.8, 2, oneFifth), 3.55],
  ["TF-2 040", FAIRING, plate(3, 0.95, 4, { ...oneFifth, localSpeedRatio: 0.6 }), 5.86],
  ["TF-2 050", FAIRING, plate(5.8, 0.2, 2, oneFifth), 2.62],
  ["TF-2 060", FAIRING, plate(0.25, 0.95, 2, laminar), 0.37],
  ["TF-2 070", FAIRING, body(0.3, 0.06), 6.89],
  ["TF-2 090", FAIRING, body(0.9, 0.0192, 0.7), 4.63],
  ["TF-2 100", FAIRING, body(1.1, 0.027, 0.45), 5.12],
  ["PD-7 010", DUCT, plate(6, 2, 2, oneFifth), 3.28],
  ["PD-7 020", DUCT, plate(6, 1.5, 2, oneFifth), 2.46],
  ["PD-7 030", DUCT, plate(6, 2, 2, { ...oneFifth, localSpeedRatio: 8.24 / 8 }), 3.46],
  ["PD-7 050", DUCT, plate(1.2, 1.5, 8, { ...mixed, localSpeedRatio: 1.25 }), 2.07],
  ["PD-7 060", DUCT, plate(0.15, 1, 240, laminar), 6.48],
  ["PD-7 070", DUCT, plate(0.3, 1.5, 24, laminar), 1.37],
  ["PD-7 080", DUCT, loss(0.12), 12.99],
  ["PD-7 090", DUCT, loss(0.19), 20.56],
  ["PD-7 100", DUCT, loss(0.6), 64.93],
  ["GS-4 010", SIGN, plate(6, 2.4, 1, oneFifth), 13.13],
  ["GS-4 020", SIGN, plate(6, 2.4, 1, rough), 16.56],
  ["GS-4 030", SIGN, plate(6, 0.12, 2, oneFifth), 1.31],
  ["GS-4 040", SIGN, body(0.55, 0.288), 48.65],
  ["GS-4 060", SIGN, body(1.2, 0.72, 0.4), 106.14],
  ["GS-4 070", SIGN, plate(6, 0.18, 3, rough), 3.73],
];

describe("the demo products' basic estimates", () => {
  it.each(PRINTED)("%s", (_name, point, item, newtons) => {
    expect(Math.abs(answerOf(point, item).drag - newtons)).toBeLessThanOrEqual(0.006);
  });
});
