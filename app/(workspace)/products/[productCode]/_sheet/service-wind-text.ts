import type { ProductKind } from "@/lib/vocabulary/lines";

/** What a sheet is not, where a result could decide whether something stays up; page, print and export carry it. */
export function serviceWindText(kind: ProductKind): string | null {
  if (kind !== "sign_panel") return null;
  return (
    "A drag budget is a service-wind estimate, not a structural wind load: the local wind-load code and a licensed " +
    "engineer decide. Results come from empirical correlations with scatter."
  );
}
