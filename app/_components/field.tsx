import { type ReactNode, useId } from "react";

export interface FieldTexts {
  label: ReactNode;
  /** What to write, with an example. */
  hint?: ReactNode;
  /** What is wrong and what would be right. */
  error?: string;
  /** Said beside the label where a field may stay empty. */
  optional?: boolean;
}

interface FieldAria {
  id: string;
  "aria-describedby": string | undefined;
  "aria-invalid": true | undefined;
}

interface FieldProps extends FieldTexts {
  /** The control; it takes the attributes that tie label, hint and error to it. */
  children: (aria: FieldAria) => ReactNode;
  id?: string;
}

export const CONTROL =
  "block w-full min-h-9 rounded-edge border border-ink-2 bg-sheet px-2.5 py-1.5 text-base text-ink placeholder:text-ink-2 aria-invalid:border-signal aria-invalid:border-2 disabled:bg-band disabled:text-ink-2";

/** Label above, hint and error below, all tied to the control. */
export function Field({ label, hint, error, optional, children, id }: FieldProps) {
  const made = useId();
  const own = id ?? made;
  const hintId = `${own}-hint`;
  const errorId = `${own}-error`;
  const describedBy = [hint ? hintId : "", error ? errorId : ""].filter(Boolean).join(" ");

  return (
    <div className="min-w-0">
      <label htmlFor={own} className="mb-1 block text-sm font-medium">
        {label}
        {optional ? <span className="font-normal text-ink-2"> (may stay empty)</span> : null}
      </label>
      {children({
        id: own,
        "aria-describedby": describedBy || undefined,
        "aria-invalid": error ? true : undefined,
      })}
      {hint ? (
        <p id={hintId} className="mt-1 text-xs text-ink-2">
          {hint}
        </p>
      ) : null}
      {error ? (
        <p id={errorId} className="mt-1 text-sm font-medium text-signal">
          <span aria-hidden>✕ </span>
          {error}
        </p>
      ) : null}
    </div>
  );
}
