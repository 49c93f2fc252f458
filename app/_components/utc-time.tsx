import { utcMinuteText } from "./utc-text";

/** A stored time, printed to the minute; the seconds are there for who points at it. */
export function UtcTime({ at }: { at: string }) {
  return (
    <time dateTime={at} title={at} className="whitespace-nowrap">
      {utcMinuteText(at)}
    </time>
  );
}
