import type { Figure, RuleId } from '../finding';

/** Longer lists of ids are folded: a key is kept with an acceptance and has to stay short. */
const longestSpelledOut = 400;

/**
 * What an acceptance holds for: this rule, these things, this figure to the millimetre, 10 g, degree or per cent. When one of
 * them changes the finding is another one, and has to be accepted anew.
 */
export function keyOf(ruleId: RuleId, subjects: readonly string[], figure: Figure | null): string {
  const ids = [...new Set(subjects)].sort().join('+');
  const about = ids.length <= longestSpelledOut ? ids : `${subjects.length} things ${fold(ids)}`;
  return figure === null ? `${ruleId}|${about}` : `${ruleId}|${about}|${rounded(figure)}`;
}

function rounded({ measured, unit }: Figure): string {
  const value = unit === 'kg' ? measured.toFixed(2) : measured.toFixed(0);
  // toFixed spells a small negative number as -0.
  return `${value.replace(/^-(0(?:\.0+)?)$/, '$1')} ${unit}`;
}

/** Two 32-bit FNV-1a sums with different starts: enough to tell two lists of one load apart, and no more is asked of it. */
function fold(text: string): string {
  const sum = (start: number) => {
    let hash = start;
    for (let index = 0; index < text.length; index += 1) {
      hash = Math.imul(hash ^ text.charCodeAt(index), 0x01000193) >>> 0;
    }
    return hash.toString(16).padStart(8, '0');
  };
  return sum(0x811c9dc5) + sum(0x9dc5811c);
}
