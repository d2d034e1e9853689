import type { Figure } from '#domain/load/finding';

const units: Readonly<Record<Figure['unit'], string>> = {
  mm: ' mm',
  kg: ' kg',
  deg: '°',
  '%': ' %',
  s: ' s',
  degC: ' °C',
  count: '',
};

const origins: Readonly<Record<Figure['limitFrom'], string>> = {
  ifu: 'from its instructions for use',
  'house-rule': 'house rule',
  default: 'default, yours to set',
  equipment: 'of the equipment',
};

const wants: Readonly<Record<Figure['want'], string>> = {
  'at-least': 'want at least',
  'at-most': 'want at most',
  exactly: 'want',
};

/** "12 mm" */
export function figureWords(figure: Figure, value: number): string {
  const decimals = figure.unit === 'kg' ? 1 : 0;
  return `${Number(value.toFixed(decimals))}${units[figure.unit]}`;
}

/** "want at least 25 mm (house rule)" */
export function limitWords(figure: Figure): string {
  return `${wants[figure.want]} ${figureWords(figure, figure.limit)} (${origins[figure.limitFrom]})`;
}
