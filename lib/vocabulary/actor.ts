import type { Role } from "./roles";

export interface Membership {
  productId: number;
  role: Role;
}

/** Who acts: plain facts of the signed-in person, loaded afresh for every request. */
export interface Actor {
  userId: number;
  /** The name as it is printed on signatures and history entries. */
  printedName: string;
  isAdministrator: boolean;
  /** Memberships in force at the moment of the request. */
  memberships: readonly Membership[];
}
