import type { Route } from "next";
import Link from "next/link";

import { FigureWithTable } from "@/app/_components/figure-with-table";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { formatNewtons, formatNewtonsChangeNumber, formatNewtonsNumber } from "@/lib/units/format-newtons";

import { bridgeLayout } from "@/app/(workspace)/products/[productCode]/_pictures/bridge-layout";
import { BridgePicture } from "@/app/(workspace)/products/[productCode]/_pictures/bridge-picture";
import type { ProposalBridge } from "@/app/(workspace)/products/[productCode]/_pictures/proposal-bridge";

interface ProposalBridgeFigureProps {
  bridge: ProposalBridge;
  from: number;
  to: number;
  operatingPoint: string;
  productCode: string;
}

/** Which proposal took or gave how much between two issues. */
export function ProposalBridgeFigure({ bridge, from, to, operatingPoint, productCode }: ProposalBridgeFigureProps) {
  const steps = bridge.steps.map(({ label, title, delta }) => ({ label: `${label} ${title}`, delta }));
  const layout = bridgeLayout({ label: `issue ${from}`, total: bridge.was }, steps, {
    label: `issue ${to}`,
    total: bridge.now,
  });
  const count = `${steps.length} ${steps.length === 1 ? "proposal" : "proposals"}`;

  return (
    <FigureWithTable
      summary={`Predicted at ${operatingPoint} from ${formatNewtons(bridge.was)} at issue ${from} to ${formatNewtons(bridge.now)} at issue ${to}, by ${count}.`}
      picture={<BridgePicture layout={layout} />}
      caption={`Predicted at ${operatingPoint}, newtons, a step for each approved proposal${from > to ? ", taken back from the later issue to the earlier one" : ""}: solid where it rises, hollow where it falls. The ruler does not begin at zero.`}
      table={<StepsTable bridge={bridge} from={from} to={to} productCode={productCode} />}
    />
  );
}

function StepsTable({ bridge, from, to, productCode }: Omit<ProposalBridgeFigureProps, "operatingPoint">) {
  const { was, now, steps } = bridge;

  return (
    <Table caption={`From issue ${from} to issue ${to}, proposal by proposal`}>
      <TableHead>
        <Head>Proposal</Head>
        <Head>Issue</Head>
        <Head numeric unit="N">
          Change of predicted
        </Head>
      </TableHead>
      <tbody>
        <TotalRow name={`Predicted at issue ${from}`} issue={from} newtons={was} />
        {steps.map(({ issue, label, title, proposalNumber, delta }) => (
          <Row key={issue}>
            <RowHead>
              {proposalNumber === null ? (
                label
              ) : (
                <Link href={`/products/${productCode}/proposals/${proposalNumber}` as Route} className="link">
                  {label}
                </Link>
              )}{" "}
              {title}
            </RowHead>
            <Cell>{issue}</Cell>
            <Cell numeric>{formatNewtonsChangeNumber(delta)}</Cell>
          </Row>
        ))}
        <TotalRow name={`Predicted at issue ${to}`} issue={to} newtons={now} />
      </tbody>
    </Table>
  );
}

function TotalRow({ name, issue, newtons }: { name: string; issue: number; newtons: number }) {
  return (
    <Row band>
      <RowHead>{name}</RowHead>
      <Cell>{issue}</Cell>
      <Cell numeric>{formatNewtonsNumber(newtons)}</Cell>
    </Row>
  );
}
