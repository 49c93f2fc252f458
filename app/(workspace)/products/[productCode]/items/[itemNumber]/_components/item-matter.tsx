import type { Route } from "next";
import Link from "next/link";

import type { ChosenMeasure } from "@/app/(workspace)/_measures/chosen-measure";
import { RevisionLetter } from "@/app/_components/revision-letter";
import { SectionHeading } from "@/app/_components/section-heading";
import type { LineRevisionView } from "@/lib/budget/views";
import { fieldRows } from "@/lib/evaluation/lines/field-rows";
import type { LineOf } from "@/lib/evaluation/lines/line-state";
import { nameBookOf } from "@/lib/evaluation/lines/name-book";
import type { ItemFile } from "@/lib/proposals/reading/item-files";

import { FieldTable } from "@/app/(workspace)/products/[productCode]/_components/field-table";
import { RevisionsTable } from "@/app/(workspace)/products/[productCode]/_components/revisions-table";
import { WorkingNotes } from "@/app/(workspace)/products/[productCode]/_components/working-view";
import { itemNotes } from "@/app/(workspace)/products/[productCode]/_workings/item-working";
import { AlternateLinesTable } from "./alternate-lines-table";
import { AnswerTable } from "./answer-table";
import { EarlierFiles } from "./earlier-files";
import { EvidenceTable } from "./evidence-table";
import { ItemPictures } from "./item-pictures";
import { ItemWorking } from "./item-working-section";
import { type PointRow, ResultsTable } from "./results-table";

interface ItemMatterProps {
  line: LineOf<"item">;
  points: readonly PointRow[];
  /** The operating point whose working is written out. */
  shownAt: string;
  measure: ChosenMeasure;
  hrefOf: (operatingPoint: string) => string;
  revisions: readonly LineRevisionView[];
  files: readonly ItemFile[];
  now: Date;
}

/** Everything about one item at an issue: results, notes, working, fields, evidence, revisions. */
export function ItemMatter({ line, points, shownAt, measure, hrefOf, revisions, files, now }: ItemMatterProps) {
  const shown = points.find(({ sheet }) => sheet.point.operatingPoint === shownAt) ?? points[0];
  if (!shown) return null;
  const { budget, indexed } = shown.sheet;
  const names = nameBookOf(budget.state, new Map(budget.people.map(({ id, name }) => [id, name])));

  return (
    <>
      <SectionHeading aside={<>owner {shown.row.owner}</>}>
        Results <RevisionLetter letter={line.letter} />
      </SectionHeading>
      <ResultsTable points={points} measure={measure} />
      <ItemNotes points={points} />
      <SectionHeading
        aside={points.length > 1 ? <PointLinks points={points} shownAt={shownAt} hrefOf={hrefOf} /> : null}
      >
        How it comes about at {shown.sheet.point.operatingPoint}
      </SectionHeading>
      <ItemWorking shown={shown} measure={measure} />
      <SectionHeading>What the method gives</SectionHeading>
      <AnswerTable points={points} units={measure.units} />
      <AlternateLinesTable shown={shown} measure={measure} />
      <ItemPictures shown={shown} measure={measure} />
      <SectionHeading>Fields</SectionHeading>
      <FieldTable rows={fieldRows(line, names)} caption={`Fields of item ${line.number}`} units={measure.units} />
      <SectionHeading>Evidence</SectionHeading>
      <EvidenceTable
        productCode={budget.product.code}
        evidence={line.body.evidence}
        files={files}
        ageDays={indexed.terms.evidenceAgeDays}
        now={now}
      />
      <EarlierFiles productCode={budget.product.code} files={files} revisions={revisions} />
      <SectionHeading>Revisions</SectionHeading>
      <RevisionsTable revisions={revisions} productCode={budget.product.code} />
    </>
  );
}

function PointLinks({ points, shownAt, hrefOf }: Pick<ItemMatterProps, "points" | "shownAt" | "hrefOf">) {
  return points.map(({ sheet: { point } }, at) => (
    <span key={point.operatingPoint}>
      {at === 0 ? "" : " · "}
      {point.operatingPoint === shownAt ? (
        <strong>{point.operatingPoint}</strong>
      ) : (
        <Link className="link" href={hrefOf(point.operatingPoint) as Route} scroll={false}>
          {point.operatingPoint}
        </Link>
      )}
    </span>
  ));
}

/** Notes by operating point: the same code can stand at one and not at another. */
function ItemNotes({ points }: { points: readonly PointRow[] }) {
  const noted = points.filter(({ row }) => row.result.notes.length > 0);
  if (noted.length === 0) return null;

  return (
    <>
      <SectionHeading>Notes</SectionHeading>
      <div className="space-y-4">
        {noted.map(({ sheet: { point }, row }) => (
          <div key={point.operatingPoint}>
            <h3 className="mb-1 text-sm">
              {point.operatingPoint} {point.name}
            </h3>
            <WorkingNotes notes={itemNotes(row)} />
          </div>
        ))}
      </div>
    </>
  );
}
