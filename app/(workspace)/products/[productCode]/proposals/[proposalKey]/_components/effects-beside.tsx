import Link from "next/link";
import type { Route } from "next";

import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { PointEffect } from "@/lib/evaluation/budget/effects";
import type { JointView } from "@/lib/proposals/sheet-views";
import type { ProposalView } from "@/lib/proposals/views";
import { formatNewtonsChangeNumber, formatNewtonsNumber } from "@/lib/units/format-newtons";
import { STANDING_NAMES } from "@/lib/vocabulary/standing";

interface Side {
  name: string;
  points: readonly PointEffect[];
}

/** The same change on its base issue, on today's, and together with all else that is proposed. */
export function EffectsBeside({ proposal }: { proposal: ProposalView }) {
  const sides = sidesOf(proposal);
  const { jointly } = proposal;
  if (typeof jointly === "number" && sides.length < 2) return <TooMany others={jointly} code={proposal.product.code} />;
  if (sides.length < 2) return null;
  const [nearest] = sides;

  return (
    <section className="mt-5">
      <SectionHeading>The effect beside others</SectionHeading>
      <Table caption="Effect on the predicted total, newtons" showCaption narrow="stack">
        <TableHead>
          <Head className="w-[18%]">Operating point</Head>
          {sides.map(({ name }) => (
            <Head key={name} numeric unit="N">
              {name}
            </Head>
          ))}
        </TableHead>
        <tbody>
          {nearest?.points.map(({ operatingPoint, name }) => (
            <Row key={operatingPoint}>
              <RowHead label="Operating point">
                {operatingPoint} {name}
              </RowHead>
              {sides.map((side) => (
                <Cell key={side.name} numeric label={side.name}>
                  <Figures point={side.points.find((point) => point.operatingPoint === operatingPoint)} />
                </Cell>
              ))}
            </Row>
          ))}
        </tbody>
      </Table>
      {typeof jointly === "number" ? <TooMany others={jointly} code={proposal.product.code} /> : null}
      {typeof jointly === "object" && jointly ? <Others jointly={jointly} proposal={proposal} /> : null}
    </section>
  );
}

function sidesOf({ effectOnBase, effectToday, jointly }: ProposalView): Side[] {
  const isToday = effectToday !== null && effectToday.onIssue !== effectOnBase?.onIssue;
  const today = isToday ? "On today's issue" : "On issue";

  return [
    ...(effectToday ? [{ name: `${today} ${effectToday.onIssue}`, points: effectToday.points }] : []),
    ...(effectOnBase && (isToday || !effectToday)
      ? [{ name: `On the base issue ${effectOnBase.onIssue}`, points: effectOnBase.points }]
      : []),
    ...(typeof jointly === "object" && jointly ? [{ name: "Jointly with the others", points: jointly.points }] : []),
  ];
}

function Figures({ point }: { point: PointEffect | undefined }) {
  if (!point) return "–";
  const { now } = point;

  return (
    <>
      <span className="block font-semibold text-water">{formatNewtonsChangeNumber(point.predictedDelta)}</span>
      <span className="block text-xs text-ink-2">
        {now ? (
          <>
            margin {formatNewtonsNumber(now.margin)},{" "}
            <span className={now.standing === "over" ? "font-semibold text-signal" : ""}>
              {STANDING_NAMES[now.standing].toLowerCase()}
            </span>
          </>
        ) : (
          "retired"
        )}
      </span>
    </>
  );
}

function TooMany({ others, code }: { others: number; code: string }) {
  return (
    <p className="mt-2 text-sm text-ink-2">
      {others} others are proposed: see some of them together with this one on the{" "}
      <Link className="link" href={`/products/${code}/what-if`}>
        What-if sheet
      </Link>
      .
    </p>
  );
}

/** Who the others are, which of them could not follow, and where one may tick some of them alone. */
function Others({ jointly, proposal }: { jointly: JointView; proposal: ProposalView }) {
  const base = `/products/${proposal.product.code}`;
  const keys = [proposal.key, ...jointly.others.map(({ key }) => key)].map((key) => `with=${encodeURIComponent(key)}`);

  return (
    <div className="mt-2 text-sm text-ink-2">
      <p>
        Jointly with{" "}
        {jointly.others.map(({ key, label, title, counts }, at) => (
          <span key={key}>
            {at === 0 ? "" : ", "}
            <Link className="link" href={`${base}/proposals/${key}` as Route} title={title}>
              {label}
            </Link>
            {counts ? "" : " (not counted)"}
          </span>
        ))}
        , each approved in the order of its number.{" "}
        <Link className="link print:hidden" href={`${base}/what-if?${keys.join("&")}` as Route}>
          Choose which of them
        </Link>
      </p>
      {[...jointly.conflicts, ...jointly.others.flatMap(({ conflicts }) => conflicts)].map((sentence) => (
        <p key={sentence}>{sentence}</p>
      ))}
    </div>
  );
}
