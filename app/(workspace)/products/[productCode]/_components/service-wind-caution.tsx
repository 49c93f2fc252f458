import { Notice } from "@/app/_components/notice";
import type { ProductKind } from "@/lib/vocabulary/lines";

/** Where a result could decide whether something stays up, every sheet says what it is not, in print too. */
export function ServiceWindCaution({ kind }: { kind: ProductKind }) {
  if (kind !== "sign_panel") return null;

  return (
    <div className="mb-4">
      <Notice kind="caution">
        A drag budget is a service-wind estimate, not a structural wind load: the local wind-load code and a licensed
        engineer decide. Results come from empirical correlations with scatter.
      </Notice>
    </div>
  );
}
