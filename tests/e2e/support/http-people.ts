/**
 * Who acts in the tests over HTTP, with roles in product HT-1. `wanda` ends her sessions, which nobody else's tests
 * would survive; `otto` holds every role, but in HT-2.
 */
export const HTTP_PEOPLE = {
  ada: { printedName: "Ada Administrator", roles: [] },
  tansy: { printedName: "Tansy Owner", roles: ["component_owner"] },
  odo: { printedName: "Odo Owner", roles: ["component_owner"] },
  roel: { printedName: "Roel Both", roles: ["component_owner", "reviewer"] },
  ines: { printedName: "Ines Reviewer", roles: ["reviewer"] },
  elske: { printedName: "Elske Reviewer", roles: ["reviewer"] },
  lusia: { printedName: "Lusia Manager", roles: ["program_manager"] },
  fenno: { printedName: "Fenno Manager", roles: ["program_manager"] },
  maud: { printedName: "Maud Auditor", roles: ["auditor"] },
  wanda: { printedName: "Wanda Leaver", roles: ["component_owner"] },
  otto: { printedName: "Otto Elsewhere", roles: [] },
} as const;

export type PersonName = keyof typeof HTTP_PEOPLE;

export const HTTP_PASSWORD = "spray over the leeboard";
export const PRODUCT = "HT-1";
export const OTHER_PRODUCT = "HT-2";

export function emailOf(name: PersonName): string {
  return `${name}@example.org`;
}
