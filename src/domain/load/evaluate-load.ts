import type { Finding } from './finding';
import type { LoadView } from './model';
import type { LoadPolicy } from './policy';

/** Judges a load. Findings come in order of weight: what holds it, what a lead may accept, what is worth a note. */
export function evaluateLoad(_view: LoadView, _policy: LoadPolicy): readonly Finding[] {
  return [];
}

/** The letters shown for findings, in order: A to Z, then AA, AB and so on. */
export function letterFindings(
  findings: readonly Finding[],
): readonly { readonly letter: string; readonly finding: Finding }[] {
  return findings.map((finding, index) => ({ letter: letterOf(index), finding }));
}

function letterOf(index: number): string {
  const last = String.fromCharCode(65 + (index % 26));
  return index < 26 ? last : letterOf(Math.floor(index / 26) - 1) + last;
}
