import type { UnitSystem } from '../../lib/facility';
import { readNumber } from '../../lib/format';

/** What a figure in a form measures. Kept in SI: mm, kg, degrees Celsius, seconds; shown as the facility chooses. */
export type QuantityKind = 'length' | 'mass' | 'temperature' | 'minutes' | 'count';

type Scale = {
  readonly unit: string;
  readonly toShown: (si: number) => number;
  readonly toSi: (shown: number) => number;
  /** Decimals shown. */
  readonly decimals: number;
};

const same = (value: number) => value;

// Exact by definition: NIST SP 811 (2008), appendix B.8.
const mmPerInch = 25.4;
const kgPerPound = 0.453_592_37;

const minutes: Scale = { unit: 'min', toShown: (s) => s / 60, toSi: (shown) => Math.round(shown * 60), decimals: 2 };
const count: Scale = { unit: '', toShown: same, toSi: same, decimals: 6 };

const scales: Readonly<Record<UnitSystem, Readonly<Record<QuantityKind, Scale>>>> = {
  metric: {
    length: { unit: 'mm', toShown: same, toSi: same, decimals: 2 },
    mass: { unit: 'kg', toShown: same, toSi: same, decimals: 3 },
    temperature: { unit: '°C', toShown: same, toSi: same, decimals: 2 },
    minutes,
    count,
  },
  'us-customary': {
    length: {
      unit: 'in',
      toShown: (mm) => mm / mmPerInch,
      toSi: (inches) => Math.round(inches * mmPerInch * 10) / 10,
      decimals: 2,
    },
    mass: {
      unit: 'lb',
      toShown: (kg) => kg / kgPerPound,
      toSi: (pounds) => Math.round(pounds * kgPerPound * 1_000) / 1_000,
      decimals: 2,
    },
    temperature: {
      unit: '°F',
      toShown: (celsius) => celsius * 1.8 + 32,
      toSi: (fahrenheit) => Math.round(((fahrenheit - 32) / 1.8) * 10) / 10,
      decimals: 1,
    },
    minutes,
    count,
  },
};

/** What stands behind the figure: "mm", "lb", "min". */
export function unitOf(kind: QuantityKind, unitSystem: UnitSystem): string {
  return scales[unitSystem][kind].unit;
}

/** A kept figure as it is written into a field. */
export function shownText(value: number | null | undefined, kind: QuantityKind, unitSystem: UnitSystem): string {
  if (value === null || value === undefined || Number.isNaN(value)) return '';
  const { toShown, decimals } = scales[unitSystem][kind];
  return String(Number(toShown(value).toFixed(decimals)));
}

/**
 * What was written, as it is kept: null for nothing where nothing may be, NaN for what is no number.
 * A required figure that is missing is undefined.
 */
export function keptValue(
  text: string,
  { kind, unitSystem, mayBeEmpty }: { kind: QuantityKind; unitSystem: UnitSystem; mayBeEmpty: boolean },
): number | null | undefined {
  if (text.trim() === '') return mayBeEmpty ? null : undefined;
  const number = readNumber(text);
  return number === undefined ? Number.NaN : scales[unitSystem][kind].toSi(number);
}
