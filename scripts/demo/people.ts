import type { Role } from "@/lib/vocabulary/roles";

/** All persons are invented. They share one password, which the start prints. */
export const DEMO_PASSWORD = "lee of the board";

export const DEMO_PEOPLE = {
  wilmot: { name: "Wilmot Sedgeworth", email: "wilmot@thistlemere.example" },
  lusia: { name: "Lusia Oakhanger", email: "lusia@thistlemere.example" },
  fenno: { name: "Fenno Dribstone", email: "fenno@thistlemere.example" },
  ines: { name: "Ines Quarrymead", email: "ines@thistlemere.example" },
  bram: { name: "Bram Hollinside", email: "bram@thistlemere.example" },
  elske: { name: "Elske Winterhey", email: "elske@thistlemere.example" },
  tansy: { name: "Tansy Brackenholt", email: "tansy@thistlemere.example" },
  odo: { name: "Odo Pellwright", email: "odo@thistlemere.example" },
  maud: { name: "Maud Lintelby", email: "maud@thistlemere.example" },
} as const;
export type DemoPerson = keyof typeof DEMO_PEOPLE;

export const DEMO_ADMINISTRATOR: DemoPerson = "wilmot";

/** Who holds what in every one of the demo's products. */
export const DEMO_ROLES: readonly { person: DemoPerson; roles: readonly Role[] }[] = [
  { person: "lusia", roles: ["program_manager"] },
  { person: "fenno", roles: ["program_manager"] },
  { person: "ines", roles: ["reviewer"] },
  { person: "bram", roles: ["reviewer"] },
  { person: "elske", roles: ["reviewer"] },
  { person: "tansy", roles: ["component_owner"] },
  { person: "odo", roles: ["component_owner"] },
  { person: "maud", roles: ["auditor"] },
];
