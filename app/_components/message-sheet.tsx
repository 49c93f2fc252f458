import type { ReactNode } from "react";

import { PageHeading } from "./page-heading";
import { Sheet } from "./sheet";
import { TitleBlock } from "./title-block";

interface MessageSheetProps {
  title: string;
  children: ReactNode;
  /** Shown in the title block: a status, a reference. */
  reference?: string;
}

/** A page that has only something to say: not found, not allowed, something broke. */
export function MessageSheet({ title, children, reference }: MessageSheetProps) {
  return (
    <>
      <PageHeading title={title} />
      <Sheet
        titleBlock={
          <TitleBlock
            fields={[
              { label: "Sheet", value: title },
              { label: "Reference", value: reference ?? "–" },
            ]}
          />
        }
      >
        <div className="max-w-[62ch] space-y-3">{children}</div>
      </Sheet>
    </>
  );
}
