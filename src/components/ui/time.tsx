import { useFacility } from '../../lib/facility';
import {
  formatDate,
  formatDay,
  formatMoment,
  formatShortDateTime,
  formatTime,
  formatTimeWithSeconds,
  formatWeekdayDate,
  type Instant,
} from '../../lib/format';
import { useNow } from '../../lib/use-now';

function isoOf(at: Instant): string {
  return typeof at === 'string' ? at : at.toISOString();
}

/** "09:41", or "09:41:08", in the facility's zone. */
export function Time({ at, withSeconds = false }: { at: Instant; withSeconds?: boolean }) {
  const { timeZone } = useFacility();
  return (
    <time dateTime={isoOf(at)} className="tabular-nums">
      {withSeconds ? formatTimeWithSeconds(at, timeZone) : formatTime(at, timeZone)}
    </time>
  );
}

/** An instant: "17 March", "Tuesday 17 March" or "Tue 17 Mar, 06:02", in the facility's zone. */
export function DateText({ at, form = 'date' }: { at: Instant; form?: 'date' | 'weekday' | 'with-time' }) {
  const { timeZone } = useFacility();
  const forms = { date: formatDate, weekday: formatWeekdayDate, 'with-time': formatShortDateTime } as const;
  return <time dateTime={isoOf(at)}>{forms[form](at, timeZone)}</time>;
}

/** The time alone when it was today, else with its date. */
export function Moment({ at }: { at: Instant }) {
  const { timeZone } = useFacility();
  return <time dateTime={isoOf(at)}>{formatMoment(at, useNow(), timeZone)}</time>;
}

/** A calendar day "YYYY-MM-DD", such as an expiry: "17 March 2026". It has no zone. */
export function Day({ day }: { day: string }) {
  return <time dateTime={day}>{formatDay(day)}</time>;
}

/** Now, kept going: "09:41". */
export function Clock({ withSeconds = false, className = '' }: { withSeconds?: boolean; className?: string }) {
  const now = useNow(withSeconds ? 'second' : 'minute');
  return (
    <span className={`font-label tabular-nums ${className}`}>
      <Time at={now} withSeconds={withSeconds} />
    </span>
  );
}
