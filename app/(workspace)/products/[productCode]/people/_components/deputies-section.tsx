import { SectionHeading } from "@/app/_components/section-heading";
import { dayIn } from "@/lib/budget/calendar";
import type { PersonName, ProductFacts } from "@/lib/budget/views";
import type { DeputyView, MembershipView } from "@/lib/products/queries";

import { DeputiesTable } from "./deputies-table";
import { NameDeputy } from "./name-deputy";

interface DeputiesSectionProps {
  product: ProductFacts;
  deputies: readonly DeputyView[];
  memberships: readonly MembershipView[];
  readerId: number;
  mayName: boolean;
}

/** Who stands in for whom, and the way to name one's own deputy. */
export function DeputiesSection({ product, deputies, memberships, readerId, mayName }: DeputiesSectionProps) {
  const today = dayIn(product.timeZone, new Date());
  const candidates = mayName ? candidatesFor(readerId, memberships) : [];

  return (
    <section aria-labelledby="deputies" className="mt-7">
      <SectionHeading id="deputies">Deputies</SectionHeading>
      {deputies.length === 0 ? (
        <p className="border-t border-ink py-2.5 text-ink-2">
          Nobody has named a deputy. A reviewer or a program manager who is away names one here.
        </p>
      ) : (
        <DeputiesTable deputies={deputies} today={today} readerId={readerId} />
      )}
      {candidates.length > 0 ? (
        <div className="mt-3">
          <NameDeputy productCode={product.code} candidates={candidates} today={today} />
        </div>
      ) : null}
    </section>
  );
}

/** Whoever takes part here: an auditor changes nothing, not even for another. */
function candidatesFor(readerId: number, memberships: readonly MembershipView[]): PersonName[] {
  const inForce = memberships.filter(({ until, role }) => until === null && role !== "auditor");
  const people = new Map(inForce.map(({ person }) => [person.id, person]));
  people.delete(readerId);

  return [...people.values()];
}
