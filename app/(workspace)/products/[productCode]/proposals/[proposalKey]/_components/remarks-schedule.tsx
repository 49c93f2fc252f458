import type { ReactNode } from "react";

import { MarkdownText } from "@/app/_components/markdown-text";
import { RemarkFlag } from "@/app/_components/remark-flag";
import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { UtcTime } from "@/app/_components/utc-time";
import type { PersonView, RemarkView, ReplyView } from "@/lib/proposals/views";

import { RemarkDialog } from "./remark-dialog";
import { SettleDialog } from "./settle-dialog";

interface RemarksScheduleProps {
  proposalId: number;
  remarks: readonly RemarkView[];
  mayRemark: boolean;
  people: readonly PersonView[];
}

/** The numbered remarks of a proposal with their answers, and how what they asked for was settled. */
export function RemarksSchedule({ proposalId, remarks, mayRemark, people }: RemarksScheduleProps) {
  return (
    <section aria-labelledby="remarks" className="mt-7">
      <SectionHeading id="remarks" aside={asideText(remarks)}>
        Remarks
      </SectionHeading>
      {remarks.length === 0 ? (
        <p className="border-t border-ink py-2.5 text-ink-2">No remarks.</p>
      ) : (
        <Table caption="Remarks" narrow="stack">
          <TableHead>
            <Head>Remark</Head>
            <Head>On</Head>
            <Head>By</Head>
            <Head className="w-[48%]">Text</Head>
            <Head>Action</Head>
          </TableHead>
          <tbody>
            {remarks.map((remark) => (
              <RemarkRow
                key={remark.id}
                proposalId={proposalId}
                remark={remark}
                mayRemark={mayRemark}
                people={people}
              />
            ))}
          </tbody>
        </Table>
      )}
      {mayRemark ? (
        <div className="mt-3">
          <RemarkDialog
            proposalId={proposalId}
            title="Remark on the proposal"
            trigger="Remark on the proposal…"
            people={people}
          />
        </div>
      ) : null}
    </section>
  );
}

function asideText(remarks: readonly RemarkView[]): string {
  const open = remarks.filter(({ asksForAction, settled }) => asksForAction && !settled).length;
  if (open === 0) return "";

  return open === 1 ? "1 request for action is not settled" : `${open} requests for action are not settled`;
}

interface RemarkRowProps {
  proposalId: number;
  remark: RemarkView;
  mayRemark: boolean;
  people: readonly PersonView[];
}

function RemarkRow({ proposalId, remark, mayRemark, people }: RemarkRowProps) {
  return (
    <Row id={`remark-${remark.number}`} className="target:bg-water-pale">
      <RowHead label="Remark">
        <RemarkFlag>R{remark.number}</RemarkFlag>
      </RowHead>
      <Cell label="On">
        {remark.line ? `${remark.line.number} ${remark.fieldLabel ?? remark.line.name}` : "the proposal"}
        <span className="block text-xs text-ink-2">round {remark.round}</span>
        {remark.referredTo ? <span className="block text-xs text-ink-2">which said: {remark.referredTo}</span> : null}
      </Cell>
      <Cell label="By">
        {remark.author.name}
        <span className="block text-xs text-ink-2">
          <UtcTime at={remark.at} />
        </span>
      </Cell>
      <Cell label="Text">
        <Words reply={remark} />
        {remark.replies.map((reply) => (
          <div key={reply.id} className="mt-2 border-l border-rule-strong pl-3">
            <p className="text-sm font-semibold">
              {reply.author.name}, <UtcTime at={reply.at} />
            </p>
            <Words reply={reply} />
          </div>
        ))}
        {mayRemark ? (
          <div className="mt-1.5">
            <RemarkDialog
              proposalId={proposalId}
              parentId={remark.id}
              title={`Answer remark ${remark.number}`}
              trigger="Answer…"
              people={people}
              discreet
            />
          </div>
        ) : null}
      </Cell>
      <Cell label="Action">
        <ActionCell remark={remark} />
      </Cell>
    </Row>
  );
}

function Words({ reply }: { reply: ReplyView }): ReactNode {
  return (
    <>
      {reply.to.length > 0 ? (
        <p className="text-xs text-ink-2">to {reply.to.map(({ name }) => name).join(", ")}</p>
      ) : null}
      <MarkdownText text={reply.text} />
      {reply.suggestion ? (
        <p className="mt-1 text-sm">
          <span className="text-ink-2">Suggested: </span>
          {reply.suggestion}
        </p>
      ) : null}
    </>
  );
}

function ActionCell({ remark }: { remark: RemarkView }) {
  if (!remark.asksForAction) return <span className="text-ink-2">none asked</span>;
  if (remark.settled) {
    return (
      <>
        asked; settled by {remark.settled.by.name}, <UtcTime at={remark.settled.at} />
        <span className="mt-0.5 block text-sm text-ink-2">{remark.settled.reason}</span>
      </>
    );
  }

  return (
    <>
      <strong className="block font-semibold">asked, not settled</strong>
      {remark.maySettle ? (
        <div className="mt-1.5">
          <SettleDialog remarkId={remark.id} number={remark.number} />
        </div>
      ) : null}
    </>
  );
}
