import { type EffectReadings, effectText, readingAt } from "@/app/(workspace)/_measures/effect-readings";
import { NoteMark } from "@/app/_components/note-mark";
import { SectionHeading } from "@/app/_components/section-heading";
import { Cell, Head, Row, RowHead, Table, TableHead } from "@/app/_components/table";
import { readNumber, readText } from "@/lib/evaluation/measures/reading";
import type { ItemEffectView } from "@/lib/proposals/views";

interface ItemEffectsProps {
  heading: string;
  /** Said between the heading and the table. */
  lead?: string;
  effects: readonly ItemEffectView[];
  readings: EffectReadings;
}

/** Results of items at every operating point, as they were and as they become. */
export function ItemEffects({ heading, lead, effects, readings }: ItemEffectsProps) {
  if (effects.length === 0 && lead === undefined) return null;

  return (
    <section className="mt-7">
      <SectionHeading>{heading}</SectionHeading>
      {lead === undefined ? null : <p className="mb-2">{lead}</p>}
      {effects.length === 0 ? null : <EffectsTable heading={heading} effects={effects} readings={readings} />}
    </section>
  );
}

function EffectsTable({ heading, effects, readings }: Pick<ItemEffectsProps, "heading" | "effects" | "readings">) {
  const unit = readings.unit ?? undefined;

  return (
    <Table caption={heading} narrow="stack">
      <TableHead>
        <Head className="w-[40%]">Item</Head>
        <Head>Operating point</Head>
        {["Predicted was", "To be", "Effect"].map((label) => (
          <Head key={label} numeric unit={unit}>
            {label}
          </Head>
        ))}
      </TableHead>
      <tbody>
        {effects.map((effect) => (
          <EffectRow key={`${effect.item} ${effect.operatingPoint}`} effect={effect} readings={readings} />
        ))}
      </tbody>
    </Table>
  );
}

function EffectRow({ effect, readings }: { effect: ItemEffectView; readings: EffectReadings }) {
  const { item, name, operatingPoint, predictedWas, predictedNow, delta } = effect;
  const reading = readingAt(readings, operatingPoint);
  const print = readings.unit === null ? readText : readNumber;
  const moved = { was: predictedWas, now: predictedNow, delta };

  return (
    <Row>
      <RowHead label="Item">
        {item} {name}
        <NoteChanges effect={effect} />
      </RowHead>
      <Cell label="Operating point">{operatingPoint}</Cell>
      <Cell numeric label="Was">
        {predictedWas === null ? "–" : print(reading.was, predictedWas)}
      </Cell>
      <Cell numeric label="To be">
        {predictedNow === null ? "–" : print(reading.now, predictedNow)}
      </Cell>
      <Cell numeric label="Effect" className="text-water">
        {effectText(reading, moved, readings.unit === null)}
      </Cell>
    </Row>
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
