"use client";

import { Fragment } from "react";

import { Table } from "@/app/_components/table";
import type { SheetPoint } from "@/lib/budget/sheet-data";
import type { PersonName } from "@/lib/budget/views";
import type { Reading } from "@/lib/evaluation/measures/reading";
import type { UnitSystem } from "@/lib/units/us-customary";

import type { Reader, ShownRow } from "@/app/(workspace)/products/[productCode]/_sheet/chosen-rows";
import type { SheetQuery } from "@/app/(workspace)/products/[productCode]/_sheet/sheet-filter";
import { BudgetTableHead } from "./budget-table-head";
import { GroupTableRow } from "./group-table-row";
import { ItemTableRow } from "./item-table-row";
import { RowGap } from "./row-gap";
import { MOST_ROWS } from "./row-window";
import { TableKeys } from "./table-keys";
import { TotalRows } from "./total-rows";
import { useAnchoredRow } from "./use-anchored-row";
import { useRowKeys } from "./use-row-keys";
import { useRowWindow } from "./use-row-window";
import { rowKey, useSheetRows } from "./use-sheet-rows";

interface BudgetTableProps {
  product: string;
  issue: number;
  point: SheetPoint;
  /** All rows, or the first ones of a long list. */
  rows: readonly ShownRow[];
  count: number;
  people: readonly PersonName[];
  reader: Reader;
  /** Names of the methods. */
  methods: Readonly<Record<string, string>>;
  query: SheetQuery;
  reading: Reading;
  units: UnitSystem;
}

/** Items and groups with their numbers; every number opens its working. */
export function BudgetTable(props: BudgetTableProps) {
  const { product, point, count, query, reading, units, reader, methods } = props;
  const path = `/products/${product}/budget`;
  const { rows, keys, problem } = useSheetRows(props);
  const { body, window, reveal, offsetOf } = useRowWindow({ keys, count });
  const onKeyDown = useRowKeys(body, { count: keys.length, reveal });
  useAnchoredRow(body, { keys, reveal, offsetOf });
  const isLong = count > MOST_ROWS;

  return (
    <>
      <Table
        caption={`Items at ${point.operatingPoint} ${point.name}${reading.basis ? `; ${reading.basis}` : ""}`}
        rowCount={isLong ? count : undefined}
      >
        <BudgetTableHead path={path} query={query} unit={reading.unit} />
        <tbody ref={body} onKeyDown={onKeyDown}>
          {window.shown.map((place, at) => {
            const row = rows[place];
            if (!row) return null;
            const place_ = {
              "data-row": rowKey(row),
              "data-place": place,
              ...(isLong ? { "aria-rowindex": place + 2 } : {}),
            };
            return (
              <Fragment key={rowKey(row)}>
                <RowGap height={window.gaps[at] ?? 0} />
                {row.kind === "item" ? (
                  <ItemTableRow
                    place={place_}
                    row={row}
                    isReference={reader.isReference}
                    method={methods[row.method] ?? row.method}
                    href={itemAddress(product, row.number, query)}
                    reading={reading}
                    units={units}
                  />
                ) : (
                  <GroupTableRow
                    place={place_}
                    row={row}
                    isReference={reader.isReference}
                    path={path}
                    query={query}
                    reading={reading}
                  />
                )}
              </Fragment>
            );
          })}
          <RowGap height={window.gaps.at(-1) ?? 0} />
        </tbody>
        <tfoot>
          <TotalRows point={point} reading={reading} />
        </tfoot>
      </Table>
      <TableKeys isLong={isLong} isRead={keys.length === count} problem={problem} />
    </>
  );
}

function itemAddress(productCode: string, number: string, { issue, point, measure }: SheetQuery): string {
  const parts = new URLSearchParams();
  if (issue !== undefined) parts.set("issue", String(issue));
  if (point !== undefined) parts.set("point", point);
  if (measure !== undefined) parts.set("measure", measure);
  const query = parts.toString();
  return `/products/${productCode}/items/${number}${query === "" ? "" : `?${query}`}`;
}
