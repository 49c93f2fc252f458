import { Button } from "@/app/_components/button";

const CONTROL = "min-h-9 rounded-edge border border-ink-2 bg-sheet px-2 py-1.5 text-base";

interface IssueFormsProps {
  productCode: string;
  numbers: readonly number[];
  compare: { from: number; to: number } | null;
  operatingPoint: string;
  measure: string | undefined;
}

/** Two questions to the issues: what two of them differ in, and how the budget stood on a day. */
export function IssueForms({ productCode, numbers, compare, operatingPoint, measure }: IssueFormsProps) {
  const newest = numbers.at(-1) ?? 1;

  return (
    <div className="flex flex-wrap items-end gap-x-10 gap-y-4 print:hidden">
      {numbers.length > 1 ? (
        <form action={`/products/${productCode}/issues`} className="flex flex-wrap items-end gap-x-3 gap-y-2">
          <input type="hidden" name="point" value={operatingPoint} />
          {measure === undefined ? null : <input type="hidden" name="measure" value={measure} />}
          <IssueChoice label="Compare issue" name="from" numbers={numbers} value={compare?.from ?? newest - 1} />
          <IssueChoice label="with issue" name="to" numbers={numbers} value={compare?.to ?? newest} />
          <Button type="submit">Compare</Button>
        </form>
      ) : null}
      <form action={`/products/${productCode}/budget`} className="flex flex-wrap items-end gap-x-3 gap-y-2">
        <label className="text-sm">
          <span className="mb-1 block font-medium">As it stood on the evening of</span>
          <input type="date" name="on" required className={CONTROL} />
        </label>
        <Button type="submit">Show the budget</Button>
      </form>
    </div>
  );
}

interface IssueChoiceProps {
  label: string;
  name: string;
  numbers: readonly number[];
  value: number;
}

function IssueChoice({ label, name, numbers, value }: IssueChoiceProps) {
  return (
    <label className="text-sm">
      <span className="mb-1 block font-medium">{label}</span>
      <select name={name} defaultValue={value} className={CONTROL}>
        {numbers.map((number) => (
          <option key={number} value={number}>
            {number}
          </option>
        ))}
      </select>
    </label>
  );
}
