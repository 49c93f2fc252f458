/** The large budgets that are measured, by code, with how many operating points each has. */
export const LARGE_BUDGETS = { "LB-1": 1, "LB-5": 5 } as const;
