import { Notice } from "@/app/_components/notice";
import type { ProductKind } from "@/lib/vocabulary/lines";

import { serviceWindText } from "../_sheet/service-wind-text";

/** Where a result could decide whether something stays up, every sheet says what it is not, in print too. */
export function ServiceWindCaution({ kind }: { kind: ProductKind }) {
  const text = serviceWindText(kind);
  if (text === null) return null;

  return (
    <div className="mb-4">
      <Notice kind="caution">{text}</Notice>
    </div>
  );
}
