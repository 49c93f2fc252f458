import { expect } from "vitest";
import type { LineEdit } from "@/lib/evaluation/budget/edits";
import type { Actor } from "@/lib/vocabulary/actor";
import { addItem, approve, bluffItem, establish, shareItem } from "@/tests/support/budget-on-file";
import { person, product, withRole } from "@/tests/support/people";

export const ISSUE_1 = "2026-03-01T09:00:00.000Z";
export const ISSUE_2 = "2026-03-10T09:00:00.000Z";
export const ISSUE_3 = "2026-03-20T09:00:00.000Z";
const MASS_UNITS = 287.05287;
/** Ideal gas at 15 °C and 101 325 Pa (ISO 2533), q = ½ρU² at 25 m/s, Pa. */
export const Q = 0.5 * (101325 / (MASS_UNITS * 288.15)) * 25 ** 2;

export interface Cast {
  tansy: Actor;
  ines: Actor;
  lusia: Actor;
}

export async function cast(): Promise<Cast> {
  await product("TF-2");
  return {
    tansy: await withRole(await person("Tansy Merle"), "TF-2", "component_owner"),
    ines: await withRole(await person("Ines Maat"), "TF-2", "reviewer"),
    lusia: await withRole(await person("Lusia Brand"), "TF-2", "program_manager"),
  };
}

export const revise = (number: string, baseLetter: string, body: object): LineEdit => ({
  operation: "revise",
  kind: "item",
  number,
  baseLetter,
  body,
});

/** Issue 2 adds 010 and a share of it, issue 3 makes 010 smaller and of a better grade. */
export async function threeIssues({ tansy, ines, lusia }: Cast): Promise<void> {
  await establish(lusia, "TF-2", ISSUE_1);
  await approve("TF-2", ISSUE_2, {
    proposer: tansy,
    signers: [
      [ines, "reviewer"],
      [lusia, "program_manager"],
    ],
    edits: [
      addItem("010", bluffItem(tansy.userId, 0.5, 0.2)),
      addItem("020", shareItem(tansy.userId, 0.1, ["010"], { order: 20 })),
    ],
    title: "Mirrors and their gaps",
  });
  const evidence = [{ document: "7731", revision: "C", date: "2026-03-15" }];
  await approve("TF-2", ISSUE_3, {
    proposer: tansy,
    signers: [[ines, "reviewer"]],
    edits: [revise("010", "–", bluffItem(tansy.userId, 0.4, 0.2, { grade: "layout", evidence }))],
    title: "Smaller mirrors",
  });
}

/** To a part in 10⁹: what is stored keeps 12 digits. */
export function close(value: number): unknown {
  return expect.closeTo(value, 9 - Math.ceil(Math.log10(Math.abs(value))));
}
