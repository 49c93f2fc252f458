/** Anything in a budget that can change and therefore has revisions. */
export const LINE_KINDS = ["item", "group", "operating_point", "finish", "allocations", "terms"] as const;
export type LineKind = (typeof LINE_KINDS)[number];

export const LINE_KIND_NAMES: Record<LineKind, string> = {
  item: "Item",
  group: "Group",
  operating_point: "Operating point",
  finish: "Finish",
  allocations: "Allocations",
  terms: "Terms",
};

export const EDIT_OPERATIONS = ["add", "revise", "retire", "reinstate"] as const;
export type EditOperation = (typeof EDIT_OPERATIONS)[number];

export const PRODUCT_KINDS = ["vehicle_fairing", "duct", "sign_panel", "other_body"] as const;
export type ProductKind = (typeof PRODUCT_KINDS)[number];

export const PRODUCT_KIND_NAMES: Record<ProductKind, string> = {
  vehicle_fairing: "Vehicle fairing",
  duct: "Duct",
  sign_panel: "Sign panel",
  other_body: "Other body",
};
