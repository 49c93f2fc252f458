import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { ITEM_METHODS } from "@/lib/evaluation/lines/item-methods";
import type { BudgetState } from "@/lib/evaluation/lines/line-state";
import { METHOD_NAMES, type MethodName } from "@/lib/evaluation/methods/method-name";
import { METHOD_VERSIONS } from "@/lib/evaluation/methods/method-versions";

/** Every published version of every method, the newest first, and the items that are computed by it. */
export function MethodsTable({ state }: { state: BudgetState }) {
  const rows = METHOD_NAMES.flatMap((method) =>
    METHOD_VERSIONS[method].toReversed().map((published) => ({ method, ...published })),
  );

  return (
    <Table caption="Methods and their versions" narrow="stack">
      <TableHead>
        <Head>Method</Head>
        <Head>Version</Head>
        <Head>What tells it from the others</Head>
        <Head>Source</Head>
        <Head>Items computed by it</Head>
      </TableHead>
      <tbody>
        {rows.map(({ method, version, what, source }) => (
          <Row key={`${method} ${version}`} data-method={`${method} ${version}`}>
            <RowHead label="Method">{ITEM_METHODS[method].label}</RowHead>
            <Cell label="Version">{version}</Cell>
            <Cell label="What">{what}</Cell>
            <Cell label="Source" className="text-sm text-ink-2">
              {source}
            </Cell>
            <Cell label="Items">
              {itemsBy(state, method, version).join(", ") || <span className="text-ink-2">none</span>}
            </Cell>
          </Row>
        ))}
      </tbody>
    </Table>
  );
}

function itemsBy({ lines }: BudgetState, method: MethodName, version: number): string[] {
  return lines.flatMap((line) =>
    line.kind === "item" && !line.retired && line.body.method === method && line.body.methodVersion === version
      ? [line.number]
      : [],
  );
}
