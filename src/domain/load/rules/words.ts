import type { Figure, Source } from '../finding';
import type { CatalogueItem } from '../model';

const unitWords: Readonly<Record<Figure['unit'], string>> = {
  mm: ' mm',
  kg: ' kg',
  deg: ' degrees',
  '%': ' %',
  s: ' s',
  degC: ' °C',
  count: '',
};

/** "12 mm" and "25 mm": with as many decimals as it takes for the two to differ, or for the mass to mean something. */
export function figureWords(figure: Pick<Figure, 'measured' | 'limit' | 'unit'>): { measured: string; limit: string } {
  const { measured, limit, unit } = figure;
  for (let decimals = unit === 'kg' ? 1 : 0; decimals < 3; decimals += 1) {
    if (measured.toFixed(decimals) !== limit.toFixed(decimals)) {
      return { measured: tidy(measured, decimals) + unitWords[unit], limit: tidy(limit, decimals) + unitWords[unit] };
    }
  }
  return { measured: tidy(measured, 3) + unitWords[unit], limit: tidy(limit, 3) + unitWords[unit] };
}

/** "A", "A and B", "A, B and C", "A, B, C and 4 more". */
export function listWords(names: readonly string[], most = 3): string {
  const shown = names.slice(0, most);
  const rest = names.length - shown.length;
  if (rest > 0) return `${shown.join(', ')} and ${rest} more`;
  const last = shown.pop();
  if (last === undefined) return '';
  return shown.length === 0 ? last : `${shown.join(', ')} and ${last}`;
}

export function countWords(count: number, one: string, many: string): string {
  return `${count} ${count === 1 ? one : many}`;
}

export function sentence(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** The source of a limit: the item's own instructions where the limit comes from there, else the rule's. */
export function sourceOf(limitFrom: Figure['limitFrom'], item: CatalogueItem, otherwise: Source): Source {
  if (limitFrom === 'house-rule') return { text: 'House rule of this facility.', provenance: 'house-rule' };
  if (limitFrom !== 'ifu') return otherwise;
  const reference = item.ifuReference ?? 'reference not on file';
  return { text: `Instructions for use of ${item.name}: ${reference}.`, provenance: 'ifu' };
}

function tidy(value: number, decimals: number): string {
  return String(Number(value.toFixed(decimals)));
}
