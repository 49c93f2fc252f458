import { Op, type Transaction } from "sequelize";
import { issueFactsOf } from "@/lib/budget/issue-facts";
import type { ProductRow } from "@/lib/budget/load-budget";
import { Issue } from "@/models/issue";
import type { DaySheetView } from "../workspace-views";

/** The newest issue that stood at a person's last visit; null on the first one, or where there was none yet. */
export async function issueSeenAt(
  productId: number,
  lastSeenAt: string | null,
  tx: Transaction,
): Promise<number | null> {
  if (lastSeenAt === null) return null;
  const where = { productId, madeAt: { [Op.lte]: lastSeenAt } };
  return Issue.max<number | null, Issue>("number", { where, transaction: tx });
}

const FIRST_VISIT_DAYS = 14;
const DAY = 86_400_000;

/** Issues made since a person's last visit, newest first; on the first one those of two weeks. */
export async function changedSince(
  product: ProductRow,
  lastSeenAt: string | null,
  at: string,
  tx: Transaction,
): Promise<DaySheetView["changedSince"]> {
  const since = lastSeenAt ?? new Date(Date.parse(at) - FIRST_VISIT_DAYS * DAY).toISOString();
  const issues = (await issueFactsOf(product, tx)).filter((issue) => issue.at > since);
  return issues.reverse().flatMap(({ number, at: madeAt, proposal }) =>
    proposal === null
      ? []
      : [
          {
            ...{ productCode: product.code, issue: number, at: madeAt },
            ...{ label: proposal.label, title: proposal.title, key: String(proposal.number) },
          },
        ],
  );
}
