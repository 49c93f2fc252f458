/** Roles a person can hold in one product. Administering the installation is no role of a product. */
export const ROLES = ["component_owner", "reviewer", "program_manager", "auditor"] as const;
export type Role = (typeof ROLES)[number];

export const ROLE_NAMES: Record<Role, string> = {
  component_owner: "Component owner",
  reviewer: "Reviewer",
  program_manager: "Program manager",
  auditor: "Auditor",
};

/** The capacities in which a proposal is signed. */
export const CAPACITIES = ["reviewer", "program_manager"] as const;
export type Capacity = (typeof CAPACITIES)[number];
