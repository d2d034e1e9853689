import type { KeptFigure } from '#domain/policy/compare-findings';
import type { UnitSystem } from '../../lib/facility';
import { formatLength, formatMass, formatTemperature } from '../../lib/format';

const wants: Readonly<Record<KeptFigure['want'], string>> = {
  'at-least': 'want at least',
  'at-most': 'want at most',
  exactly: 'want',
};

const origins: Readonly<Record<string, string>> = {
  ifu: 'from its instructions for use',
  'house-rule': 'house rule',
  default: 'default',
  equipment: 'of the equipment',
};

function amount(value: number, unit: string, unitSystem: UnitSystem): string {
  switch (unit) {
    case 'mm':
      return formatLength(value, unitSystem);
    case 'kg':
      return formatMass(value, unitSystem);
    case 'degC':
      return formatTemperature(value, unitSystem);
    case 'deg':
      return `${Math.round(value)}°`;
    case 'count':
      return String(value);
    default:
      return `${Number(value.toFixed(1))} ${unit}`;
  }
}

/** "12 mm, want at least 25 mm (default)" */
export function figureWords({ measured, limit, unit, want, limitFrom }: KeptFigure, unitSystem: UnitSystem): string {
  const origin = origins[limitFrom] ?? limitFrom;
  return `${amount(measured, unit, unitSystem)}, ${wants[want]} ${amount(limit, unit, unitSystem)} (${origin})`;
}
