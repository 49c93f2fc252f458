import { type Capacity, ROLE_NAMES } from "@/lib/vocabulary/roles";

export const CAPACITY_NAMES: Record<Capacity, string> = {
  reviewer: ROLE_NAMES.reviewer,
  program_manager: ROLE_NAMES.program_manager,
};
