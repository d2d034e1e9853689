import type { UnitSystem } from './facility';

/** Instants come as ISO text with Z, or as Date. */
export type Instant = string | Date;

function asDate(at: Instant): Date {
  return typeof at === 'string' ? new Date(at) : at;
}

const formatters = new Map<string, Intl.DateTimeFormat>();

/** Making a formatter is slow, using it is not; a list of sixty packages makes each once. */
function formatter(timeZone: string, options: Intl.DateTimeFormatOptions): Intl.DateTimeFormat {
  const key = `${timeZone} ${JSON.stringify(options)}`;
  const known = formatters.get(key);
  if (known) return known;
  const made = new Intl.DateTimeFormat('en-GB', { ...options, timeZone, hourCycle: 'h23' });
  formatters.set(key, made);
  return made;
}

/** "09:41" */
export function formatTime(at: Instant, timeZone: string): string {
  return formatter(timeZone, { hour: '2-digit', minute: '2-digit' }).format(asDate(at));
}

/** "09:41:08" */
export function formatTimeWithSeconds(at: Instant, timeZone: string): string {
  return formatter(timeZone, { hour: '2-digit', minute: '2-digit', second: '2-digit' }).format(asDate(at));
}

function dateParts(at: Instant, timeZone: string) {
  const parts = formatter(timeZone, { weekday: 'long', day: 'numeric', month: 'long', year: 'numeric' }).formatToParts(
    asDate(at),
  );
  const part = (type: Intl.DateTimeFormatPartTypes) => parts.find((one) => one.type === type)?.value ?? '';
  return { weekday: part('weekday'), day: part('day'), month: part('month'), year: part('year') };
}

/** "17 March" */
export function formatDate(at: Instant, timeZone: string): string {
  const { day, month } = dateParts(at, timeZone);
  return `${day} ${month}`;
}

/** "17 March 2026" */
export function formatDateWithYear(at: Instant, timeZone: string): string {
  const { day, month, year } = dateParts(at, timeZone);
  return `${day} ${month} ${year}`;
}

/** "Tuesday 17 March" */
export function formatWeekdayDate(at: Instant, timeZone: string): string {
  const { weekday, day, month } = dateParts(at, timeZone);
  return `${weekday} ${day} ${month}`;
}

/** "Tue 17 Mar, 06:02" */
export function formatShortDateTime(at: Instant, timeZone: string): string {
  const { weekday, day, month } = dateParts(at, timeZone);
  return `${weekday.slice(0, 3)} ${day} ${month.slice(0, 3)}, ${formatTime(at, timeZone)}`;
}

/** "YYYY-MM-DD", the day an instant falls on in that zone. */
export function dayOf(at: Instant, timeZone: string): string {
  const parts = formatter(timeZone, { year: 'numeric', month: '2-digit', day: '2-digit' }).formatToParts(asDate(at));
  const part = (type: Intl.DateTimeFormatPartTypes) => parts.find((one) => one.type === type)?.value ?? '';
  return `${part('year')}-${part('month')}-${part('day')}`;
}

/** Today as a time, another day with its date: "09:41", "16 March, 21:10", "30 December 2025, 21:10". */
export function formatMoment(at: Instant, now: Instant, timeZone: string): string {
  const time = formatTime(at, timeZone);
  const day = dayOf(at, timeZone);
  const today = dayOf(now, timeZone);
  if (day === today) return time;
  const date = day.slice(0, 4) === today.slice(0, 4) ? formatDate(at, timeZone) : formatDateWithYear(at, timeZone);
  return `${date}, ${time}`;
}

/** A calendar day "YYYY-MM-DD" as "17 March 2026"; it has no zone. */
export function formatDay(day: string): string {
  return formatDateWithYear(`${day}T12:00:00Z`, 'UTC');
}

/** "4 min", "1 h 05 min", "90 s" */
export function formatDuration(seconds: number): string {
  const whole = Math.round(seconds);
  if (whole < 120 && whole % 60 !== 0) return `${whole} s`;
  const minutes = Math.floor(whole / 60);
  const rest = whole % 60;
  if (minutes < 60) return rest === 0 ? `${minutes} min` : `${minutes} min ${rest} s`;
  return `${Math.floor(minutes / 60)} h ${String(minutes % 60).padStart(2, '0')} min`;
}

function formatNumber(value: number, decimals: number): string {
  return value.toLocaleString('en-GB', { maximumFractionDigits: decimals, useGrouping: false });
}

// Factors: NIST SP 811 (2008), appendix B.8. Inch and pound are exact.
const mmPerInch = 25.4;
const kgPerPound = 0.453_592_37;

/** Millimetres in the facility's unit: "12 mm" or "0.47 in". */
export function formatLength(mm: number, unitSystem: UnitSystem): string {
  return unitSystem === 'metric' ? `${formatNumber(mm, 0)} mm` : `${formatNumber(mm / mmPerInch, 2)} in`;
}

/** "90 × 230 mm" */
export function formatSize(mm: readonly number[], unitSystem: UnitSystem): string {
  const shown = mm.map((one) => (unitSystem === 'metric' ? formatNumber(one, 0) : formatNumber(one / mmPerInch, 1)));
  return `${shown.join(' × ')} ${unitSystem === 'metric' ? 'mm' : 'in'}`;
}

/** Kilograms in the facility's unit: "7.4 kg" or "16.3 lb". */
export function formatMass(kg: number, unitSystem: UnitSystem): string {
  return unitSystem === 'metric' ? `${formatNumber(kg, kg < 1 ? 2 : 1)} kg` : `${formatNumber(kg / kgPerPound, 1)} lb`;
}

/** Degrees Celsius in the facility's unit: "132 °C" or "270 °F". */
export function formatTemperature(celsius: number, unitSystem: UnitSystem): string {
  return unitSystem === 'metric' ? `${formatNumber(celsius, 1)} °C` : `${formatNumber(celsius * 1.8 + 32, 0)} °F`;
}

/** "1 package", "31 packages" */
export function countOf(count: number, one: string, many = `${one}s`): string {
  return `${count} ${count === 1 ? one : many}`;
}

/** "a", "a and b", "a, b and c" */
export function listInWords(words: readonly string[]): string {
  if (words.length < 2) return words.join('');
  return `${words.slice(0, -1).join(', ')} and ${words.at(-1) ?? ''}`;
}

/** What a person typed as a number, with point or comma; undefined when it is none. */
export function readNumber(text: string): number | undefined {
  const plain = text.trim().replace(',', '.');
  return /^[+-]?(\d+(\.\d*)?|\.\d+)$/.test(plain) ? Number(plain) : undefined;
}
