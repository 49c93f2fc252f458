import { NoteMark } from "@/app/_components/note-mark";
import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import type { ItemEffectView } from "@/lib/proposals/views";
import { formatNewtonsChangeNumber, formatNewtonsNumber } from "@/lib/units/format-newtons";

/** Results of items at every operating point, as they were and as they become. */
export function ItemEffects({ heading, effects }: { heading: string; effects: readonly ItemEffectView[] }) {
  if (effects.length === 0) return null;

  return (
    <section className="mt-7">
      <SectionHeading>{heading}</SectionHeading>
      <Table caption={heading} narrow="stack">
        <TableHead>
          <Head className="w-[40%]">Item</Head>
          <Head>Operating point</Head>
          <Head numeric unit="N">
            Predicted was
          </Head>
          <Head numeric unit="N">
            To be
          </Head>
          <Head numeric unit="N">
            Effect
          </Head>
        </TableHead>
        <tbody>
          {effects.map((effect) => (
            <Row key={`${effect.item} ${effect.operatingPoint}`}>
              <RowHead label="Item">
                {effect.item} {effect.name}
                <NoteChanges effect={effect} />
              </RowHead>
              <Cell label="Operating point">{effect.operatingPoint}</Cell>
              <Cell numeric label="Was">
                {effect.predictedWas === null ? "–" : formatNewtonsNumber(effect.predictedWas)}
              </Cell>
              <Cell numeric label="To be">
                {effect.predictedNow === null ? "–" : formatNewtonsNumber(effect.predictedNow)}
              </Cell>
              <Cell numeric label="Effect" className="text-water">
                {formatNewtonsChangeNumber(effect.delta)}
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
    </section>
  );
}

function NoteChanges({ effect }: { effect: ItemEffectView }) {
  return (
    <>
      {effect.notesNew.map((note) => (
        <NoteMark key={`new ${note.code}`} severity={note.severity}>
          new: {note.sentence}
        </NoteMark>
      ))}
      {effect.notesVanished.map((note) => (
        <NoteMark key={`gone ${note.code}`} severity="information">
          no longer: {note.sentence}
        </NoteMark>
      ))}
    </>
  );
}
